/**
 * Where words stand on a chart. Each label has a few places it could take; the one that covers least is taken, in the order the labels
 * are given. So limits keep their line, marks stay at their point, and the name of a curve finds room beside it.
 */

export type Point = { x: number; y: number };
/** A place to choose from. `price` is what it costs by itself: standing far from what is named. */
export type Place = Point & { price?: number };
export type Box = { left: number; top: number; right: number; bottom: number };

/**
 * A label to place, in pixels.
 *
 * places   centres of the box, best first
 * own      index of the curve it names: near that one is fine, near another one misleads
 */
export type LabelToPlace = { width: number; height: number; places: readonly Place[]; own?: number };

/**
 * Obstacles in pixels.
 *
 * curves[k][i]   points of curve k, close enough together to be the line
 * levels, posts  limit lines across the whole area
 */
export type Obstacles = { area: Box; curves: readonly (readonly Point[])[]; levels: readonly number[]; posts: readonly number[] };

const cost = { outside: 1000, label: 400, limit: 120, curve: 14, mistaken: 8, later: 1 };
const breath = 2;
/** A curve this near could be taken for the one that is named. */
const mistakable = 14;

/** Box of each label, same order; a label without places gives null. */
export function placeLabels(labels: readonly LabelToPlace[], obstacles: Obstacles): (Box | null)[] {
  const taken: Box[] = [];
  return labels.map((label) => {
    let best: Box | null = null;
    let least = Infinity;
    label.places.forEach((place, order) => {
      const box = boxAround(place, label);
      const price = priceOf(box, label, obstacles, taken) + order * cost.later + (place.price ?? 0);
      if (price < least) {
        least = price;
        best = box;
      }
    });
    if (best) taken.push(best);
    return best;
  });
}

const boxAround = ({ x, y }: Point, { width, height }: LabelToPlace): Box => ({
  left: x - width / 2,
  right: x + width / 2,
  top: y - height / 2,
  bottom: y + height / 2,
});

function priceOf(box: Box, { own }: LabelToPlace, { area, curves, levels, posts }: Obstacles, taken: readonly Box[]): number {
  let price = 0;
  if (box.left < area.left || box.right > area.right || box.top < area.top || box.bottom > area.bottom) price += cost.outside;
  price += cost.label * taken.filter((other) => overlap(box, other)).length;
  price += cost.limit * levels.filter((y) => y > box.top - breath && y < box.bottom + breath).length;
  price += cost.limit * posts.filter((x) => x > box.left - breath && x < box.right + breath).length;
  curves.forEach((points, index) => {
    price += cost.curve * Math.min(points.filter((point) => inside(point, box, breath)).length, 10);
    if (index !== own && points.some((point) => inside(point, box, mistakable))) price += cost.mistaken;
  });
  return price;
}

const inside = ({ x, y }: Point, box: Box, margin: number): boolean =>
  x > box.left - margin && x < box.right + margin && y > box.top - margin && y < box.bottom + margin;

const overlap = (a: Box, b: Box): boolean => a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom;

/** Places for the name of a curve: above and below, right and left, along its length. */
export function placesAlong(points: readonly Point[], size: { width: number; height: number }): Point[] {
  const gap = 6;
  const up = size.height / 2 + gap;
  const aside = size.width / 2 + gap + 2;
  return [0.3, 0.45, 0.2, 0.6, 0.12, 0.75, 0.88, 0.04].flatMap((share) => {
    const at = points[Math.round(share * (points.length - 1))];
    if (!at) return [];
    return [
      { x: at.x, y: at.y - up },
      { x: at.x + aside, y: at.y },
      { x: at.x + aside, y: at.y - up },
      { x: at.x, y: at.y + up },
      { x: at.x - aside, y: at.y },
    ];
  });
}

/** Places around a marked point: above, at the upper corners, beside, below, and then the same a little farther off. */
export function placesAround({ x, y }: Point, { width, height }: { width: number; height: number }): Place[] {
  return [0, 14, 30].flatMap((farther) => {
    const up = height / 2 + 9 + farther;
    const aside = width / 2 + 10 + farther;
    const price = farther * 3;
    return [
      { x, y: y - up, price },
      { x: x + aside, y: y - up, price },
      { x: x - aside, y: y - up, price },
      { x: x + aside, y, price },
      { x, y: y + up, price },
      { x: x + aside, y: y + up, price },
      { x: x - aside, y: y + up, price },
      { x: x - aside, y, price },
    ];
  });
}

/** Where a thin line from a point should meet a label that had to stand off; null for a label close by. */
export function leaderTo({ x, y }: Point, box: Box): Point | null {
  const end = { x: Math.min(Math.max(x, box.left), box.right), y: Math.min(Math.max(y, box.top), box.bottom) };
  return Math.hypot(end.x - x, end.y - y) > 18 ? end : null;
}

/** Places for the words of a level: at its right end, in its middle, at its left end; above the line, then below. */
export function placesAtLevel(y: number, area: Box, { width, height }: { width: number; height: number }): Point[] {
  const up = height / 2 + 4;
  return [area.right - width / 2 - 2, (area.left + area.right) / 2, area.left + width / 2 + 4].flatMap((x) => [
    { x, y: y - up },
    { x, y: y + up },
  ]);
}

/** Places for the words of a post: right of it from the top down, then left of it. */
export function placesAtPost(x: number, area: Box, { width, height }: { width: number; height: number }): Point[] {
  const aside = width / 2 + 6;
  const heights = [0, 1, 2, 3, 4].map((row) => area.top + height / 2 + 2 + row * (height + 2));
  return [...heights.map((y) => ({ x: x + aside, y })), ...heights.map((y) => ({ x: x - aside, y }))];
}

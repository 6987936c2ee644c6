/** Inside outline of a vessel as seen from the side, in metres: x along the page, y upward from the lowest inside point. */
import type { VesselShape } from "@/engine/vessel/geometry";
import { makeHead, type Head } from "@/engine/vessel/head";

export type Point = { x: number; y: number };

export type Profile = {
  /** Closed outline, anticlockwise from the lowest point at the left. */
  outline: Point[];
  widthM: number;
  heightM: number;
  /** As the vessel is, where the outline is cut short. */
  trueHeightM: number;
  /** Where a lying cylinder's shell begins and ends, for its tangent lines. */
  tangents?: [number, number];
  /** The length was cut, because the whole would be too thin to see. */
  broken: boolean;
  /** Inside diameter of the end view that belongs to a lying cylinder. */
  endViewM?: number;
};

/** A cylinder longer than this many diameters is drawn with its length broken. */
const longestInDiameters = 14;
const brokenInDiameters = 9;
const pointsPerPiece = 20;

/** Undefined for what has no shape to draw: a plain volume, a section of several parts. */
export function profileOf(vessel: VesselShape): Profile | undefined {
  switch (vessel.shape) {
    case "sphere":
      return {
        outline: circle(vessel.insideDiameterM),
        widthM: vessel.insideDiameterM,
        heightM: vessel.insideDiameterM,
        trueHeightM: vessel.insideDiameterM,
        broken: false,
      };
    case "cylinder":
      return vessel.orientation === "vertical" ? standing(vessel) : lying(vessel);
    case "pipe":
      return lying({
        shape: "cylinder",
        orientation: "horizontal",
        insideDiameterM: vessel.insideDiameterM,
        tangentLengthM: vessel.lengthM,
        heads: "flat",
      });
    default:
      return undefined;
  }
}

type Cylinder = Extract<VesselShape, { shape: "cylinder" }>;

function lying({ insideDiameterM: D, tangentLengthM: L, heads }: Cylinder): Profile {
  const head = makeHead(heads, D);
  const broken = L > longestInDiameters * D;
  const shell = broken ? brokenInDiameters * D : L;
  const [left, right] = [head.depthM, head.depthM + shell];
  const meridian = meridianOf(head);
  // From the bottom at the left tangent line: along the bottom, up the right head, back along the top, down the left head.
  const outline = [
    { x: left, y: 0 },
    ...[...meridian].reverse().map(({ radius, depth }) => ({ x: right + depth, y: D / 2 - radius })),
    ...meridian.map(({ radius, depth }) => ({ x: right + depth, y: D / 2 + radius })),
    ...[...meridian].reverse().map(({ radius, depth }) => ({ x: left - depth, y: D / 2 + radius })),
    ...meridian.map(({ radius, depth }) => ({ x: left - depth, y: D / 2 - radius })),
  ];
  return { outline, widthM: shell + 2 * head.depthM, heightM: D, trueHeightM: D, tangents: [left, right], broken, endViewM: D };
}

function standing({ insideDiameterM: D, tangentLengthM: L, heads }: Cylinder): Profile {
  const head = makeHead(heads, D);
  const broken = L > longestInDiameters * D;
  const shell = broken ? brokenInDiameters * D : L;
  const meridian = meridianOf(head);
  const [low, high] = [head.depthM, head.depthM + shell];
  const outline = [
    ...meridian.map(({ radius, depth }) => ({ x: D / 2 + radius, y: low - depth })),
    ...[...meridian].reverse().map(({ radius, depth }) => ({ x: D / 2 + radius, y: high + depth })),
    ...meridian.map(({ radius, depth }) => ({ x: D / 2 - radius, y: high + depth })),
    ...[...meridian].reverse().map(({ radius, depth }) => ({ x: D / 2 - radius, y: low - depth })),
  ];
  return { outline, widthM: D, heightM: shell + 2 * head.depthM, trueHeightM: L + 2 * head.depthM, broken };
}

/** Points of a head from the pole to the tangent line; a flat end goes straight from the axis to the corner. */
function meridianOf(head: Head): { radius: number; depth: number }[] {
  if (head.pieces.length === 0)
    return [
      { radius: 0, depth: 0 },
      { radius: head.radiusM, depth: 0 },
    ];
  return head.pieces.flatMap(({ from, to, radius, depth }) =>
    Array.from({ length: pointsPerPiece + 1 }, (_, i) => {
      const at = from + ((to - from) * i) / pointsPerPiece;
      return { radius: radius(at), depth: depth(at) };
    }),
  );
}

export function circle(D: number): Point[] {
  const R = D / 2;
  return Array.from({ length: 72 }, (_, i) => {
    const angle = -Math.PI / 2 + (2 * Math.PI * i) / 72;
    return { x: R + R * Math.cos(angle), y: R + R * Math.sin(angle) };
  });
}

/**
 * A closed convex outline cut at a height.
 *
 * Returns   the runs of wall below and above, each from one crossing to the other; the whole outline where the level does not cut it
 */
export function cutAtLevel(outline: readonly Point[], levelM: number): { below: Point[]; above: Point[] } {
  const closed = (points: readonly Point[]) => [...points, ...points.slice(0, 1)];
  if (outline.every(({ y }) => y >= levelM)) return { below: [], above: closed(outline) };
  if (outline.every(({ y }) => y <= levelM)) return { below: closed(outline), above: [] };
  const cut: Point[] = [];
  outline.forEach((point, i) => {
    cut.push(point);
    const next = outline[(i + 1) % outline.length];
    if (!next || (point.y - levelM) * (next.y - levelM) >= 0) return;
    const part = (levelM - point.y) / (next.y - point.y);
    cut.push({ x: point.x + part * (next.x - point.x), y: levelM });
  });
  const side = (keeps: (y: number) => boolean) => {
    // Turned so that the run begins where the outline enters this side.
    const first = cut.findIndex(({ y }, i) => keeps(y) && !keeps(cut[(i - 1 + cut.length) % cut.length]?.y ?? Number.NaN));
    const turned = [...cut.slice(first), ...cut.slice(0, first)];
    const end = turned.findIndex(({ y }) => !keeps(y));
    return turned.slice(0, end < 0 ? undefined : end);
  };
  return { below: side((y) => y <= levelM), above: side((y) => y >= levelM) };
}

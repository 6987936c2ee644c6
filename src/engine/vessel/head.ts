/**
 * Heads as bodies of revolution: one or two smooth pieces of meridian, each by its own angle, from the pole to the tangent line.
 *
 * Source   shapes of DIN 28011 (Klöpper: crown D, knuckle 0.1 D), DIN 28013 (Korbbogen: 0.8 D, 0.154 D), the flanged and dished head with
 *          crown D and knuckle 0.06 D, and the 2:1 half ellipse. The standards define crown and knuckle on the outside diameter; the
 *          inside diameter is used here throughout, a simplification of the order of thickness over diameter.
 */
import { integral } from "./gauss-legendre";

export const headShapes = [
  "flat",
  "hemispherical",
  "ellipsoidal-2-1",
  "torispherical-kloepper",
  "torispherical-korbbogen",
  "torispherical-flanged-dished",
] as const;
export type HeadShape = (typeof headShapes)[number];

/** A piece of meridian by its parameter: radius from the axis, its derivative, depth beyond the tangent line, arc length per parameter. */
export type MeridianPiece = {
  from: number;
  to: number;
  radius: (p: number) => number;
  radiusRate: (p: number) => number;
  depth: (p: number) => number;
  arc: (p: number) => number;
};

export type Head = { depthM: number; radiusM: number; pieces: MeridianPiece[] };

const torispherical: Partial<Record<HeadShape, { crown: number; knuckle: number }>> = {
  "torispherical-kloepper": { crown: 1, knuckle: 0.1 },
  "torispherical-korbbogen": { crown: 0.8, knuckle: 0.154 },
  "torispherical-flanged-dished": { crown: 1, knuckle: 0.06 },
};

/** The inside of a head on a shell of inside diameter D; `growM` gives the outside: every radius larger by the thickness. */
export function makeHead(shape: HeadShape, insideDiameterM: number, growM = 0): Head {
  const R = insideDiameterM / 2;
  if (shape === "flat") return { depthM: growM, radiusM: R + growM, pieces: [] };
  const form = torispherical[shape];
  if (form) return dished(R + growM, form.crown * insideDiameterM + growM, form.knuckle * insideDiameterM + growM);
  return ellipsoid(R + growM, (shape === "hemispherical" ? R : R / 2) + growM);
}

function ellipsoid(R: number, a: number): Head {
  const piece: MeridianPiece = {
    from: 0,
    to: Math.PI / 2,
    radius: (t) => R * Math.sin(t),
    radiusRate: (t) => R * Math.cos(t),
    depth: (t) => a * Math.cos(t),
    arc: (t) => Math.hypot(R * Math.cos(t), a * Math.sin(t)),
  };
  return { depthM: a, radiusM: R, pieces: [piece] };
}

function dished(R: number, crown: number, knuckle: number): Head {
  const offset = Math.sqrt((crown - knuckle) ** 2 - (R - knuckle) ** 2);
  const joint = Math.acos((R - knuckle) / (crown - knuckle));
  const cap: MeridianPiece = {
    from: 0,
    to: Math.PI / 2 - joint,
    radius: (t) => crown * Math.sin(t),
    radiusRate: (t) => crown * Math.cos(t),
    depth: (t) => crown * Math.cos(t) - offset,
    arc: () => crown,
  };
  const ring: MeridianPiece = {
    from: joint,
    to: 0,
    radius: (t) => R - knuckle + knuckle * Math.cos(t),
    radiusRate: (t) => -knuckle * Math.sin(t),
    depth: (t) => knuckle * Math.sin(t),
    arc: () => -knuckle,
  };
  return { depthM: crown - offset, radiusM: R, pieces: [cap, ring] };
}

/** Volume [m³] between head and tangent plane, and inside area [m²] of the head. */
export function wholeHead(head: Head): { volumeM3: number; areaM2: number } {
  if (head.pieces.length === 0)
    return { volumeM3: Math.PI * head.radiusM ** 2 * head.depthM, areaM2: Math.PI * head.radiusM ** 2 };
  return byRings(head, () => 2 * Math.PI, []);
}

/**
 * Part of a head on a horizontal shell below a liquid surface at height `levelM` above the lowest point.
 * Each ring of radius ρ is wetted over the angle θ = 2 acos((R − h)/ρ).
 */
export function headBelowLevelLyingDown(head: Head, levelM: number): { volumeM3: number; areaM2: number } {
  const d = head.radiusM - levelM;
  const angle = (ring: number): number => (d <= -ring ? 2 * Math.PI : d >= ring ? 0 : 2 * Math.acos(d / ring));
  if (head.pieces.length === 0) return { volumeM3: 0, areaM2: segmentArea(head.radiusM, levelM) };
  return byRings(head, angle, [Math.abs(d)]);
}

/** Part of a bottom head, standing up, below a height `levelM` above its pole. */
export function headBelowLevelStanding(head: Head, levelM: number): { volumeM3: number; areaM2: number } {
  if (head.pieces.length === 0) return { volumeM3: 0, areaM2: levelM > 0 ? Math.PI * head.radiusM ** 2 : 0 };
  let volumeM3 = 0;
  let areaM2 = 0;
  const h = Math.min(levelM, head.depthM);
  for (const piece of head.pieces) {
    const top = parameterWhere((p) => head.depthM - piece.depth(p) - h, piece);
    // Slices π ρ² dy turned by parts into shells, so that only the surface itself is integrated.
    volumeM3 += integral(
      (p) => 2 * Math.PI * piece.radius(p) * (h - head.depthM + piece.depth(p)) * piece.radiusRate(p),
      piece.from,
      top,
    );
    areaM2 += integral((p) => 2 * Math.PI * piece.radius(p) * piece.arc(p), piece.from, top);
  }
  return { volumeM3, areaM2 };
}

/** Area of the segment of a circle of radius R below the height h. */
export function segmentArea(R: number, h: number): number {
  const depth = Math.min(Math.max(h, 0), 2 * R);
  return R * R * Math.acos((R - depth) / R) - (R - depth) * Math.sqrt(Math.max(2 * R * depth - depth * depth, 0));
}

function byRings(head: Head, angle: (ring: number) => number, breaks: number[]): { volumeM3: number; areaM2: number } {
  let volumeM3 = 0;
  let areaM2 = 0;
  for (const piece of head.pieces) {
    const cuts = [piece.from, ...breaks.map((ring) => parameterWhere((p) => piece.radius(p) - ring, piece)), piece.to];
    for (let i = 1; i < cuts.length; i++) {
      const [from, to] = [cuts[i - 1] ?? 0, cuts[i] ?? 0];
      volumeM3 += integral((p) => piece.depth(p) * angle(piece.radius(p)) * piece.radius(p) * piece.radiusRate(p), from, to);
      areaM2 += integral((p) => angle(piece.radius(p)) * piece.radius(p) * piece.arc(p), from, to);
    }
  }
  return { volumeM3, areaM2 };
}

/** Parameter at which a function that rises along the piece passes zero, held to the ends of the piece. */
function parameterWhere(f: (p: number) => number, { from, to }: MeridianPiece): number {
  if (f(from) >= 0) return from;
  if (f(to) <= 0) return to;
  let [low, high] = [from, to];
  for (let i = 0; i < 100 && low !== high; i++) {
    const middle = (low + high) / 2;
    if (f(middle) < 0) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/**
 * What a vessel holds and how much of its inside a liquid wets.
 *
 * Shapes: a plain volume with a stated inside area; a cylinder lying or standing between two equal heads; a sphere; a level run of pipe,
 * whose open ends have no metal; and a section of several of these, in which the liquid stands equally high above the lowest point of each.
 * Holds    internals, nozzles and connected pipe are not counted; straight flanges belong to the tangent length
 * Checks   geometry.test.ts
 */
import { bracketedRoot } from "../ode/bracketed-root";
import { headBelowLevelLyingDown, headBelowLevelStanding, makeHead, segmentArea, wholeHead, type HeadShape } from "./head";

export type VesselShape =
  | { shape: "volume"; volumeM3: number; innerAreaM2?: number }
  | {
      shape: "cylinder";
      orientation: "vertical" | "horizontal";
      insideDiameterM: number;
      tangentLengthM: number;
      heads: HeadShape;
    }
  | { shape: "sphere"; insideDiameterM: number }
  | { shape: "pipe"; insideDiameterM: number; lengthM: number }
  | { shape: "section"; parts: VesselShape[] };

export type Filled = { volumeM3: number; areaM2: number };

export type MeasuredVessel = {
  volumeM3: number;
  /** Inside area, heads included. Absent for a plain volume that states none. */
  innerAreaM2: number | undefined;
  /** Height from the lowest to the highest inside point; absent where the shape is unknown. */
  heightM: number | undefined;
  /** Liquid volume [m³] and wetted area [m²] below a level above the lowest point. */
  below: ((levelM: number) => Filled) | undefined;
  /** Volume of the wall [m³] for a thickness: outside less inside (a half ellipse grows by the thickness on both its axes). */
  wallVolume: (thicknessM: number) => number | undefined;
};

export function measureVessel(vessel: VesselShape): MeasuredVessel {
  if (vessel.shape === "volume") return plainVolume(vessel.volumeM3, vessel.innerAreaM2);
  if (vessel.shape === "sphere") return sphere(vessel.insideDiameterM);
  if (vessel.shape === "pipe") return pipe(vessel.insideDiameterM, vessel.lengthM);
  if (vessel.shape === "section") return section(vessel.parts.map(measureVessel));
  return cylinder(vessel);
}

export const totalVolume = (vessel: VesselShape): number => measureVessel(vessel).volumeM3;

export const insideArea = (vessel: VesselShape): number | undefined => measureVessel(vessel).innerAreaM2;

/** Level [m] at which the liquid has the wanted volume; the volume rises strictly with the level. */
export function levelAtVolume(geometry: MeasuredVessel, liquidVolumeM3: number): number | undefined {
  const { below, heightM, volumeM3 } = geometry;
  if (!below || heightM === undefined) return undefined;
  if (liquidVolumeM3 <= 0) return 0;
  if (liquidVolumeM3 >= volumeM3) return heightM;
  const excess = (level: number): number => below(level).volumeM3 - liquidVolumeM3;
  return bracketedRoot(excess, { a: 0, fa: -liquidVolumeM3, b: heightM, fb: volumeM3 - liquidVolumeM3 }, 1e-12 * heightM);
}

function plainVolume(volumeM3: number, innerAreaM2: number | undefined): MeasuredVessel {
  return {
    volumeM3,
    innerAreaM2,
    heightM: undefined,
    below: undefined,
    wallVolume: (thicknessM) => (innerAreaM2 === undefined ? undefined : innerAreaM2 * thicknessM),
  };
}

function sphere(D: number): MeasuredVessel {
  const R = D / 2;
  return {
    volumeM3: (Math.PI * D ** 3) / 6,
    innerAreaM2: Math.PI * D ** 2,
    heightM: D,
    below: (levelM) => {
      const h = Math.min(Math.max(levelM, 0), D);
      return { volumeM3: (Math.PI * h ** 2 * (3 * R - h)) / 3, areaM2: 2 * Math.PI * R * h };
    },
    wallVolume: (s) => (Math.PI * ((D + 2 * s) ** 3 - D ** 3)) / 6,
  };
}

function pipe(D: number, L: number): MeasuredVessel {
  const R = D / 2;
  return {
    volumeM3: Math.PI * R ** 2 * L,
    innerAreaM2: Math.PI * D * L,
    heightM: D,
    below: (levelM) => {
      const h = Math.min(Math.max(levelM, 0), D);
      return { volumeM3: segmentArea(R, h) * L, areaM2: 2 * R * Math.acos((R - h) / R) * L };
    },
    wallVolume: (s) => Math.PI * ((R + s) ** 2 - R ** 2) * L,
  };
}

/** One part of unknown shape or area leaves the sum unknown. */
function section(parts: MeasuredVessel[]): MeasuredVessel {
  const sum = (pick: (part: MeasuredVessel) => number): number => parts.reduce((total, part) => total + pick(part), 0);
  const known = (pick: (part: MeasuredVessel) => number | undefined): number | undefined =>
    parts.every((part) => pick(part) !== undefined) ? sum((part) => pick(part) ?? 0) : undefined;
  const shaped = parts.every((part) => part.below && part.heightM !== undefined);
  return {
    volumeM3: sum((part) => part.volumeM3),
    innerAreaM2: known((part) => part.innerAreaM2),
    heightM: shaped ? Math.max(...parts.map((part) => part.heightM ?? 0)) : undefined,
    below: shaped
      ? (levelM) => ({
          volumeM3: sum((part) => part.below?.(levelM).volumeM3 ?? 0),
          areaM2: sum((part) => part.below?.(levelM).areaM2 ?? 0),
        })
      : undefined,
    wallVolume: (s) => known((part) => part.wallVolume(s)),
  };
}

function cylinder(vessel: Extract<VesselShape, { shape: "cylinder" }>): MeasuredVessel {
  const { insideDiameterM: D, tangentLengthM: L, heads } = vessel;
  const R = D / 2;
  const head = makeHead(heads, D);
  const whole = wholeHead(head);
  const volumeM3 = Math.PI * R ** 2 * L + 2 * whole.volumeM3;
  const innerAreaM2 = Math.PI * D * L + 2 * whole.areaM2;
  const heightM = vessel.orientation === "vertical" ? L + 2 * head.depthM : D;

  const lying = (levelM: number): Filled => {
    const h = Math.min(Math.max(levelM, 0), D);
    const end = headBelowLevelLyingDown(head, h);
    return { volumeM3: segmentArea(R, h) * L + 2 * end.volumeM3, areaM2: 2 * R * Math.acos((R - h) / R) * L + 2 * end.areaM2 };
  };
  const standing = (levelM: number): Filled => {
    const h = Math.min(Math.max(levelM, 0), heightM);
    const bottom = headBelowLevelStanding(head, h);
    const shell = Math.min(Math.max(h - head.depthM, 0), L);
    const inTop = h - head.depthM - L;
    if (inTop <= 0 && h < heightM)
      return { volumeM3: bottom.volumeM3 + Math.PI * R ** 2 * shell, areaM2: bottom.areaM2 + Math.PI * D * shell };
    const dry = headBelowLevelStanding(head, heightM - h);
    const roofDry = h >= heightM ? 0 : dry.areaM2;
    return { volumeM3: volumeM3 - dry.volumeM3, areaM2: innerAreaM2 - roofDry };
  };

  return {
    volumeM3,
    innerAreaM2,
    heightM,
    below: vessel.orientation === "vertical" ? standing : lying,
    wallVolume: (s) => Math.PI * (R + s) ** 2 * L + 2 * wholeHead(makeHead(heads, D, s)).volumeM3 - volumeM3,
  };
}

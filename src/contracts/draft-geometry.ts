/** The vessel of a draft, from its dimensions and its level by the engine's geometry. */
import type { VesselGeometry } from "@/engine/cases/blowdown-case";
import { levelAtVolume, measureVessel, type MeasuredVessel } from "@/engine/vessel/geometry";
import { isAsked, type DraftDocument } from "./draft";
import type { LineNo } from "./lines/line";
import { lineByNo, lineKey } from "./lines/registry";

export type ShapeGeometry = {
  document: VesselGeometry;
  measured: MeasuredVessel;
  volumeM3: number;
  insideAreaM2: number | undefined;
  largestBoreM: number;
};

/** Undefined while a dimension is missing, not finite or not positive. */
export function shapeGeometry(draft: DraftDocument): ShapeGeometry | undefined {
  const shape = valueOf(draft, "2.02")?.typed;
  if (shape === "volume") {
    const volumeM3 = positive(draft, "2.06");
    if (volumeM3 === undefined) return undefined;
    const innerAreaM2 = isAsked(lineByNo("4.04"), draft) ? positive(draft, "4.04") : undefined;
    return measured(
      { shape: "volume", volumeM3, ...(innerAreaM2 === undefined ? {} : { innerAreaM2 }) },
      2 * Math.cbrt(volumeM3),
    );
  }
  const insideDiameterM = positive(draft, "2.04");
  if (insideDiameterM === undefined) return undefined;
  if (shape === "sphere") return measured({ shape: "sphere", insideDiameterM }, insideDiameterM);

  const tangentLengthM = valueOf(draft, "2.05")?.si;
  if (shape === "pipe") {
    if (typeof tangentLengthM !== "number" || !(tangentLengthM > 0)) return undefined;
    return measured({ shape: "pipe", insideDiameterM, lengthM: tangentLengthM }, insideDiameterM);
  }
  const heads = valueOf(draft, "2.03")?.typed;
  if (typeof tangentLengthM !== "number" || !(tangentLengthM >= 0) || !heads) return undefined;
  const orientation = shape === "cylinder-vertical" ? "vertical" : "horizontal";
  return measured({ shape: "cylinder", orientation, insideDiameterM, tangentLengthM, heads } as VesselGeometry, insideDiameterM);
}

export type LiquidAtStart = {
  volumeM3: number;
  /** Part of the vessel's volume, 0 to 1. */
  part: number;
  /** Absent for a plain volume. */
  levelM: number | undefined;
};

/**
 * Liquid as the start condition gives it: from a height, or as part of the volume.
 *
 * Returns  undefined where no liquid is asked for, or while a figure is missing or lies outside the vessel
 */
export function liquidAtStart(draft: DraftDocument, geometry: ShapeGeometry): LiquidAtStart | undefined {
  const { volumeM3, measured: vessel } = geometry;
  if (isAsked(lineByNo("2.07"), draft)) {
    const levelM = valueOf(draft, "2.07")?.si;
    if (typeof levelM !== "number" || !vessel.below || !(levelM >= 0 && levelM <= (vessel.heightM ?? 0))) return undefined;
    const filled = Math.min(vessel.below(levelM).volumeM3, volumeM3);
    return { volumeM3: filled, part: filled / volumeM3, levelM };
  }
  if (!isAsked(lineByNo("2.14"), draft)) return undefined;
  const part = valueOf(draft, "2.14")?.si;
  if (typeof part !== "number" || !(part >= 0 && part <= 1)) return undefined;
  return { volumeM3: part * volumeM3, part, levelM: levelAtVolume(vessel, part * volumeM3) };
}

const valueOf = (draft: DraftDocument, no: LineNo) => draft.lines[lineKey(lineByNo(no), "A")];

function positive(draft: DraftDocument, no: LineNo): number | undefined {
  const si = valueOf(draft, no)?.si;
  return typeof si === "number" && Number.isFinite(si) && si > 0 ? si : undefined;
}

function measured(document: VesselGeometry, largestBoreM: number): ShapeGeometry {
  const vessel = measureVessel(document);
  return { document, measured: vessel, volumeM3: vessel.volumeM3, insideAreaM2: vessel.innerAreaM2, largestBoreM };
}

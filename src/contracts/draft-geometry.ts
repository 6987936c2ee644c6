/** Volume and inside surface of a draft's vessel, from its dimensions by the engine's geometry. */
import type { VesselGeometry } from "@/engine/cases/blowdown-case";
import { insideArea, totalVolume } from "@/engine/vessel/geometry";
import type { DraftDocument } from "./draft";
import type { LineNo } from "./lines/line";
import { lineByNo, lineKey } from "./lines/registry";

export type ShapeGeometry = { document: VesselGeometry; volumeM3: number; insideAreaM2: number | undefined; largestBoreM: number };

/** Undefined while a dimension is missing, not finite or not positive. */
export function shapeGeometry(draft: DraftDocument): ShapeGeometry | undefined {
  const value = (no: LineNo) => draft.lines[lineKey(lineByNo(no), "A")];
  const positive = (no: LineNo) => {
    const si = value(no)?.si;
    return typeof si === "number" && Number.isFinite(si) && si > 0 ? si : undefined;
  };
  const shape = value("2.02")?.typed;

  if (shape === "volume") {
    const volumeM3 = positive("2.06");
    if (volumeM3 === undefined) return undefined;
    const insideAreaM2 = positive("4.04");
    const document: VesselGeometry = { shape: "volume", volumeM3, ...(insideAreaM2 === undefined ? {} : { innerAreaM2: insideAreaM2 }) };
    return { document, volumeM3, insideAreaM2, largestBoreM: 2 * Math.cbrt(volumeM3) };
  }

  const insideDiameterM = positive("2.04");
  if (insideDiameterM === undefined) return undefined;
  if (shape === "sphere") return measured({ shape: "sphere", insideDiameterM }, insideDiameterM);

  const tangentLengthM = value("2.05")?.si;
  const heads = value("2.03")?.typed;
  if (typeof tangentLengthM !== "number" || !(tangentLengthM >= 0) || !heads) return undefined;
  const orientation = shape === "cylinder-vertical" ? "vertical" : "horizontal";
  const document = { shape: "cylinder", orientation, insideDiameterM, tangentLengthM, heads } as VesselGeometry;
  return measured(document, insideDiameterM);
}

function measured(document: VesselGeometry, largestBoreM: number): ShapeGeometry {
  return { document, volumeM3: totalVolume(document), insideAreaM2: insideArea(document), largestBoreM };
}

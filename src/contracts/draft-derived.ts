/** Values of lines that nobody types because they follow from others, with the words for where they come from. */
import { steelById, steelIds } from "@/engine/steels/steel";
import type { HeadShape } from "@/engine/vessel/head";
import type { DraftDocument } from "./draft";
import { liquidAtStart, shapeGeometry, type ShapeGeometry } from "./draft-geometry";
import type { DerivedLine, LineNo } from "./lines/line";
import { lineByNo, lineKey } from "./lines/registry";

export type Derived = { si: number; from: string };

/** SI value of a derived line and its formula in words; undefined while a line it needs is missing. */
export function derivedValue(draft: DraftDocument, { no }: DerivedLine): Derived | undefined {
  const geometry = shapeGeometry(draft);
  if (!geometry) return undefined;
  switch (no) {
    case "2.12":
      return { si: geometry.volumeM3, from: volumeWords(geometry) };
    case "2.15":
      return liquid(draft, geometry);
    case "4.09":
      return geometry.insideAreaM2 === undefined ? undefined : { si: geometry.insideAreaM2, from: areaWords(geometry) };
    case "4.16":
      return steelMass(draft, geometry);
    default:
      return undefined;
  }
}

/** Volume and inside surface of one head; D is the inside diameter. The last four are integrated over the meridian of the standard's shape. */
const heads: Record<HeadShape, { volume: string; area: string }> = {
  flat: { volume: "flat ends", area: "two ends, π D²/4 each" },
  hemispherical: { volume: "two half spheres, π D³/12 each", area: "two half spheres, π D²/2 each" },
  "ellipsoidal-2-1": { volume: "two 2:1 half ellipsoids, π D³/24 each", area: "two 2:1 half ellipsoids, 1.084 D² each" },
  "torispherical-kloepper": dished("Klöpper heads of DIN 28011"),
  "torispherical-korbbogen": dished("Korbbogen heads of DIN 28013"),
  "torispherical-flanged-dished": dished("flanged and dished heads, crown D, knuckle 0.06 D"),
};

function dished(what: string) {
  return { volume: `two ${what}, integrated`, area: `two ${what}, integrated` };
}

function volumeWords({ document }: ShapeGeometry): string {
  if (document.shape === "sphere") return "line 2.04: π D³/6";
  if (document.shape === "pipe") return "lines 2.04 and 2.05: π D² L/4";
  return document.shape === "cylinder" ? `lines 2.03 to 2.05: shell π D² L/4, ${heads[document.heads].volume}` : "";
}

function areaWords({ document }: ShapeGeometry): string {
  if (document.shape === "sphere") return "line 2.04: π D²";
  if (document.shape === "pipe") return "lines 2.04 and 2.05: π D L, ends left out";
  return document.shape === "cylinder" ? `lines 2.03 to 2.05: shell π D L, ${heads[document.heads].area}` : "";
}

function liquid(draft: DraftDocument, geometry: ShapeGeometry): Derived | undefined {
  const found = liquidAtStart(draft, geometry);
  if (!found) return undefined;
  const share = `${(100 * found.part).toPrecision(3)} % of the volume`;
  return { si: found.volumeM3, from: `shape and level: ${share}` };
}

function steelMass(draft: DraftDocument, { measured }: ShapeGeometry): Derived | undefined {
  const value = (no: LineNo) => draft.lines[lineKey(lineByNo(no), "A")];
  const thicknessM = value("4.03")?.si;
  const steel = steelIds.find((id) => id === value("4.02")?.typed);
  if (!steel || typeof thicknessM !== "number" || !(thicknessM > 0)) return undefined;
  const volumeM3 = measured.wallVolume(thicknessM);
  if (volumeM3 === undefined) return undefined;
  const { densityKgPerM3 } = steelById(steel);
  return {
    si: volumeM3 * densityKgPerM3,
    from: `lines 4.02 and 4.03: wall volume outside less inside, ${Math.round(densityKgPerM3)} kg/m³`,
  };
}

/** The drawing in words, for those who listen. */
import type { OutletPlace } from "@/engine/cases/blowdown-case";
import type { HeadShape } from "@/engine/vessel/head";
import type { VesselItem } from "./vessel-layout";

const headWords: Record<HeadShape, string> = {
  flat: "flat ends",
  hemispherical: "hemispherical heads",
  "ellipsoidal-2-1": "2:1 ellipsoidal heads",
  "torispherical-kloepper": "Klöpper heads",
  "torispherical-korbbogen": "Korbbogen heads",
  "torispherical-flanged-dished": "flanged and dished heads",
};

const outletWords: Record<OutletPlace, string> = {
  vapour: "The outlet leaves from the vapour space.",
  liquid: "The outlet leaves from the liquid.",
  whole: "The outlet takes the whole contents, mixed.",
};

/**
 * length    writes metres in the unit in use
 * Returns   one sentence for each vessel, one for the outlet
 */
export function vesselSentence(
  items: readonly VesselItem[],
  outlet: OutletPlace | undefined,
  length: (metres: number) => string,
): string {
  const vessels = items.map(({ tag, geometry, levelM }) => {
    const level = levelM === undefined ? "" : levelM > 0 ? `, liquid to ${length(levelM)}` : ", no liquid";
    return `${tag || "The vessel"}: ${shapeWords(geometry, length)}${level}.`;
  });
  return ["To scale.", ...vessels, ...(outlet ? [outletWords[outlet]] : [])].join(" ");
}

function shapeWords(geometry: VesselItem["geometry"], length: (metres: number) => string): string {
  if (geometry.shape === "sphere") return `a sphere of ${length(geometry.insideDiameterM)} inside diameter`;
  if (geometry.shape === "pipe")
    return `a pipe of ${length(geometry.insideDiameterM)} inside diameter, ${length(geometry.lengthM)} long`;
  if (geometry.shape !== "cylinder") return "a plain volume without a shape";
  const { orientation, insideDiameterM, tangentLengthM, heads } = geometry;
  return `a ${orientation} cylinder of ${length(insideDiameterM)} inside diameter, ${length(tangentLengthM)} between tangents, ${headWords[heads]}`;
}

/** From a path of the case document back to the line it was made from, so that what the engine refuses is cited by line. */
import type { LineKey, LineNo } from "./lines/line";
import { lineByNo, lineKey } from "./lines/registry";

/** The longest path that begins the refused one decides; order does not matter. */
const lineOfPath: Record<string, LineNo> = {
  title: "1.10",
  fluid: "3.01",
  "fluid.equation": "3.02",
  "fluid.interaction": "3.03",
  vessel: "2.02",
  "vessel.geometry": "2.02",
  "vessel.geometry.heads": "2.03",
  "vessel.geometry.insideDiameterM": "2.04",
  "vessel.geometry.tangentLengthM": "2.05",
  "vessel.geometry.lengthM": "2.05",
  "vessel.geometry.volumeM3": "2.06",
  "vessel.geometry.innerAreaM2": "4.04",
  "vessel.wall": "4.08",
  "vessel.wall.steel": "4.02",
  "vessel.wall.thicknessM": "4.03",
  "vessel.wall.massKg": "4.10",
  "vessel.wall.specificHeatJPerKgK": "4.15",
  "vessel.wall.designPressurePa": "4.11",
  "vessel.wall.minimumDesignMetalTemperatureK": "4.05",
  "vessel.wall.insulation": "4.12",
  "vessel.wall.insulation.thicknessM": "4.13",
  "vessel.wall.insulation.conductivityWPerMK": "4.14",
  start: "2.08",
  "start.pressurePa": "2.09",
  "start.temperatureK": "2.10",
  "start.liquidVolumeFraction": "2.14",
  "start.restAtTemperatureK": "2.11",
  release: "5.01",
  "release.diameterM": "5.02",
  "release.dischargeCoefficient": "5.03",
  "release.backPressurePa": "5.04",
  "release.openingTimeS": "5.05",
  "release.from": "5.06",
  "release.cv": "5.07",
  "release.xt": "5.08",
  "release.flowModel": "5.09",
  "release.targetPressurePa": "5.10",
  "release.targetTimeS": "5.11",
  "release.areaM2": "5.12",
  "release.setPressurePa": "5.13",
  "release.reseatPressurePa": "5.14",
  "release.tailPipe": "5.15",
  "release.tailPipe.lengthM": "5.16",
  "release.tailPipe.diameterM": "5.17",
  "release.tailPipe.roughnessM": "5.18",
  "release.tailPipe.lossCoefficient": "5.19",
  "heat.inside": "6.01",
  "heat.inside.coefficientWPerM2K": "6.08",
  "heat.wall": "4.08",
  "heat.outside": "6.02",
  "heat.outside.basis": "6.03",
  "heat.outside.heatFluxWPerM2": "6.04",
  "heat.outside.heatW": "6.09",
  "heat.outside.temperatureK": "6.10",
  "heat.outside.coefficientWPerM2K": "6.11",
  "heat.outside.drainage": "6.12",
  "heat.outside.environmentFactor": "6.13",
  run: "7.10",
  "run.stopTimeS": "7.10",
  "run.stopPressurePa": "7.11",
  limits: "7.01",
  "limits.targetTimeS": "7.01",
  "limits.minimumMetalMarginK": "7.02",
  "limits.minimumOutletTemperatureK": "7.03",
  "limits.ventCapacityKgPerS": "7.04",
  "limits.targetPressurePa": "7.09",
  "limits.waterPresent": "7.13",
  afterwards: "6.14",
  "afterwards.ambientTemperatureK": "6.14",
  "afterwards.coefficientWPerM2K": "6.15",
  "limits.nearBandK": "7.08",
  "limits.nearBandFraction": "7.12",
};

/**
 * path      of the case document: "fluid.components[1].moleFraction"
 * Returns   the key of the line to change; undefined for a path that no line stands behind
 */
export function lineKeyOfPath(path: string, letter: string): LineKey | undefined {
  let rest = path.replace(/\[\d+\]/g, "");
  for (;;) {
    const no = Object.hasOwn(lineOfPath, rest) ? lineOfPath[rest] : undefined;
    if (no) return lineKey(lineByNo(no), letter);
    if (!rest.includes(".")) return undefined;
    rest = rest.slice(0, rest.lastIndexOf("."));
  }
}

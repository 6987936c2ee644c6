/** Which temperatures of a run are worth a curve: zones that are told apart get one each, zones that are the same get one together. */
import type { CurveTone } from "@/components/charts/curve";
import type { BlowdownSeries } from "@/engine/cases/blowdown-result";

export type TemperatureColumn = { id: string; label: string; tone: CurveTone; valuesK: readonly number[] };

/** Nearer than this over the whole run two curves would lie upon each other. */
const sameK = 0.05;

/** Fluid, or vapour and liquid where they differ; wall, or the parts that gas and liquid wet where they differ. */
export function temperatureColumns(series: BlowdownSeries): TemperatureColumn[] {
  const { fluidTemperatureK: fluid, vapourTemperatureK: vapour, liquidTemperatureK: liquid } = series;
  const { gasWallTemperatureK: gasWall, liquidWallTemperatureK: liquidWall } = series;
  const fluids: TemperatureColumn[] =
    vapour && liquid && !alike(vapour, liquid)
      ? [
          { id: "vapour", label: "vapour", tone: "fluid", valuesK: vapour },
          { id: "liquid", label: "liquid", tone: "liquid", valuesK: liquid },
        ]
      : [{ id: "fluid", label: "fluid", tone: "fluid", valuesK: fluid }];
  if (!gasWall) return fluids;
  if (!liquidWall || alike(gasWall, liquidWall))
    return [...fluids, { id: "wall", label: "wall", tone: "wall", valuesK: gasWall }];
  return [
    ...fluids,
    { id: "gas-wall", label: "gas wall", tone: "wall", valuesK: gasWall },
    { id: "liquid-wall", label: "liquid wall", tone: "liquid-wall", valuesK: liquidWall },
  ];
}

const alike = (one: readonly number[], other: readonly number[]): boolean =>
  one.length === other.length && one.every((value, i) => Math.abs(value - (other[i] ?? Number.NaN)) < sameK);

import type { StatePoint } from "../cases/path-case";
import type { FluidModel } from "../eos/fluid-model";
import { airMolarMass, hydrateFlagTemperature, hydrateMarginK } from "../solids/hydrate";

const steps = 24;
/** Where the correlations were fitted [K], and a little beyond, where the line bends away from them. */
const fittedK = [260, 298] as const;

export type HydrateLine = { points: StatePoint[]; marginK: number } | { refused: string };

/**
 * Temperature below which hydrate is to be reckoned with, over pressure: the higher of two correlations on gas gravity and a margin.
 *
 * Source   solids/hydrate.ts
 * Returns  points from low pressure to high inside the range of the correlations; or why there is no line
 */
export function hydrateLine(model: FluidModel, lowestPa: number, highestPa: number): HydrateLine {
  const water = model.componentIds.indexOf("water");
  if (water < 0 || !(model.feed[water]! > 0)) return { refused: "There is no water in the composition, so no hydrate line." };
  const gravity = model.mixtureMolarMass(model.feed) / airMolarMass;
  if (!(gravity >= 0.55 && gravity <= 1)) {
    return {
      refused: `The hydrate correlations hold for gas gravities of 0.55 to 1.0; this fluid has ${gravity.toFixed(2)}, so no line is drawn.`,
    };
  }
  const points: StatePoint[] = [];
  for (let k = 0; k <= steps; k++) {
    const pressurePa = lowestPa * (highestPa / lowestPa) ** (k / steps);
    const temperatureK = hydrateFlagTemperature(pressurePa, gravity);
    const bare = temperatureK - hydrateMarginK;
    if (bare >= fittedK[0] && bare <= fittedK[1]) points.push({ temperatureK, pressurePa });
  }
  return points.length > 1
    ? { points, marginK: hydrateMarginK }
    : { refused: "The hydrate correlations do not reach these pressures." };
}

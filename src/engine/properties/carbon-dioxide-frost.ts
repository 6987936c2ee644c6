import type { StatePoint } from "../cases/path-case";
import { EngineError } from "../errors";
import type { FluidModel } from "../eos/fluid-model";
import { bracketedRoot } from "../flash/bracketed-root";
import { flashPT } from "../flash/flash-pt";
import { onlyComponent } from "../flash/saturation-pure";
import { carbonDioxideSublimationPressure, carbonDioxideTriple, solidCarbonDioxideFugacity } from "../solids/solid-lines";

const lowestK = 155;
const pureSteps = 24;
const mixtureSteps = 14;
/** How near a point of the line is found [K]. */
const toleranceK = 0.02;

/**
 * Where solid carbon dioxide starts to form on cooling a fluid at constant pressure: its fugacity there equals that of the solid.
 *
 *   f_CO2(T, p, z) = f_s(T, p)
 *
 * Of pure carbon dioxide it is the sublimation line up to the triple point. A mixture is cooled along each pressure from the triple
 * temperature, above which the fusion line of the solid, nearly upright, isn't held.
 *
 * Source   solids/solid-lines.ts
 * Returns  points from low pressure to high; empty where no carbon dioxide is present or none would freeze above 155 K
 */
export function carbonDioxideFrostLine(model: FluidModel, lowestPa: number, highestPa: number): StatePoint[] {
  const index = model.componentIds.indexOf("carbon_dioxide");
  if (index < 0 || !(model.feed[index]! > 0)) return [];
  if (onlyComponent(model.feed) === index) return sublimationLine(lowestPa);

  const points: StatePoint[] = [];
  for (let k = 0; k <= mixtureSteps; k++) {
    const pressurePa = lowestPa * (highestPa / lowestPa) ** (k / mixtureSteps);
    const temperatureK = frostTemperature(model, index, pressurePa);
    if (temperatureK !== undefined) points.push({ temperatureK, pressurePa });
  }
  return points;
}

function sublimationLine(lowestPa: number): StatePoint[] {
  const { temperatureK: top } = carbonDioxideTriple;
  return Array.from({ length: pureSteps + 1 }, (_, k) => {
    const temperatureK = lowestK + ((top - lowestK) * k) / pureSteps;
    return { temperatureK, pressurePa: carbonDioxideSublimationPressure(temperatureK) };
  }).filter(({ pressurePa }) => pressurePa >= lowestPa);
}

function frostTemperature(model: FluidModel, index: number, pressurePa: number): number | undefined {
  const excess = (temperatureK: number) => fugacityExcess(model, index, { temperatureK, pressurePa });
  const [a, b] = [lowestK, carbonDioxideTriple.temperatureK - 1e-3];
  try {
    const [fa, fb] = [excess(a), excess(b)];
    // Where the fluid is above the solid's fugacity at the triple temperature already, the line lies on the fusion side, above it.
    if (!(fa > 0 && fb < 0)) return undefined;
    return bracketedRoot(excess, { a, fa, b, fb }, { within: toleranceK, what: "frost point of carbon dioxide" });
  } catch (error) {
    if (error instanceof EngineError) return undefined; // the equation finds no state somewhere on the way: the line has a gap
    throw error;
  }
}

/** ln(f_CO2/f_s); positive where the solid forms. */
function fugacityExcess(model: FluidModel, index: number, point: StatePoint): number {
  const { temperatureK: T, pressurePa: p } = point;
  const [phase] = flashPT(model, point).phases;
  const fluid = phase!.composition[index]! * Math.exp(phase!.lnFugacityCoefficients[index]!) * p;
  const pure = Float64Array.from(model.feed, (_, i) => (i === index ? 1 : 0));
  const lnPhi = new Float64Array(pure.length);
  const saturated = (at: number) => Math.exp(model.lnFugacityCoefficients(T, at, pure, "vapour", lnPhi)[index]!);
  return Math.log(fluid / solidCarbonDioxideFugacity(T, p, saturated));
}

/**
 * What follows a blowdown: the section stands closed in, the cold fluid and the steel even out, and both warm up in the surroundings.
 *
 *   N u(T, v) + E_wall(T) = E             E at the end of the run fixes the temperature at which they even out
 *   dE/dt = U A (T_amb − T)               t = Σ ΔE/ΔT · ln[(T_amb − T_a)/(T_amb − T_b)] / (U A), from there to the rated temperature
 *   p = p(T_amb, v)                       closed in; at constant volume, with whatever liquid is left boiling
 *
 * Source   energy balance of one lump; methods for restart after blowdown, screening only
 * Holds    an indication: the outside film is known to ±50 %, and so is the time. No leak, no sun, no frost
 * Throws   EngineError "no-convergence" where the fluid has no state at a temperature that is asked for
 * Checks   afterwards.test.ts
 */
import type { Wall } from "../cases/blowdown/wall";
import type { BlowdownCase } from "../cases/blowdown-case";
import type { Afterwards } from "../cases/blowdown-result";
import type { FluidModel } from "../eos/fluid-model";
import { EngineError } from "../errors";
import type { Equilibrium } from "../flash/equilibrium";
import { bracketedRoot } from "../ode/bracketed-root";
import { flashTV } from "../start/flash-tv";

/** What is in the vessel, and how cold its steel is, when the run ends. */
export type EndOfRun = {
  fluid: FluidModel;
  volumeM3: number;
  areaM2: number | undefined;
  composition: ArrayLike<number>;
  totalMolesMol: number;
  internalEnergyJ: number;
  temperatureK: number;
  startTemperatureK: number;
  wall: Wall | undefined;
  wallMeanK: number | undefined;
  coldestSteelK: number | undefined;
};

/** Still air with radiation, the low end: little warming is the careful side for cold steel. */
const stillAirWPerM2K = 8;
const bandK = 10;
const timeBand = 0.5;
const pieces = 16;

type Given = Pick<BlowdownCase, "afterwards" | "heat" | "vessel">;

export function afterwards(given: Given, end: EndOfRun): Afterwards {
  const { surroundings, assumed } = surroundingsOf(given, end);
  const closedIn = closedInPressure(given, end, surroundings.temperatureK);
  const rewarm = rewarming(given, end, surroundings);
  return { assumed, surroundings, ...(rewarm ? { rewarm } : {}), closedIn };
}

function surroundingsOf({ afterwards: stated = {}, heat: { outside } }: Given, { startTemperatureK }: EndOfRun) {
  const ambient = outside.model === "ambient" ? outside : undefined;
  const assumed: string[] = [];
  const temperatureK = stated.ambientTemperatureK ?? ambient?.temperatureK ?? startTemperatureK;
  if (stated.ambientTemperatureK === undefined && !ambient)
    assumed.push("No temperature of the surroundings was given; that of the fluid at the start stands in for it.");
  const coefficientWPerM2K = stated.coefficientWPerM2K ?? ambient?.coefficientWPerM2K ?? stillAirWPerM2K;
  if (stated.coefficientWPerM2K === undefined && !ambient)
    assumed.push(`No outside film was given; ${stillAirWPerM2K} W/(m² K), still air, stands in for it.`);
  return { surroundings: { temperatureK, coefficientWPerM2K }, assumed };
}

function closedInPressure({ vessel }: Given, end: EndOfRun, temperatureK: number): Afterwards["closedIn"] {
  const at = stateFinder(end);
  const { pressurePa, vapourMoleFraction } = at(temperatureK);
  const highPa = at(temperatureK + bandK).pressurePa;
  const lowPa = at(temperatureK - bandK).pressurePa;
  const design = vessel.wall?.designPressurePa;
  return {
    temperatureK,
    pressurePa,
    bandK,
    lowPa,
    highPa,
    vapourMoleFraction,
    ...(design === undefined ? {} : { aboveDesign: highPa > design }),
  };
}

function stateFinder({ fluid, volumeM3, totalMolesMol, composition }: EndOfRun): (temperatureK: number) => Equilibrium {
  let last: Equilibrium | undefined;
  const molarVolumeM3PerMol = volumeM3 / totalMolesMol;
  return (temperatureK) => (last = flashTV(fluid, { temperatureK, molarVolumeM3PerMol }, composition, last));
}

function rewarming(
  { vessel }: Given,
  end: EndOfRun,
  { temperatureK: ambientK, coefficientWPerM2K }: Afterwards["surroundings"],
): Afterwards["rewarm"] {
  const { wall, wallMeanK, coldestSteelK, areaM2, totalMolesMol } = end;
  const ratedTemperatureK = vessel.wall?.minimumDesignMetalTemperatureK;
  if (!wall || wallMeanK === undefined || coldestSteelK === undefined || ratedTemperatureK === undefined || !areaM2)
    return undefined;

  // After a fire the steel may be too hot for the equation; it meets the fluid somewhere above the colder of the two.
  const leastK = Math.min(coldestSteelK, wallMeanK, end.temperatureK);
  if (wallMeanK > 0.97 * end.fluid.temperatureRangeK[1] && leastK >= ratedTemperatureK)
    return { state: "already-above", ratedTemperatureK, coldestAtStopK: coldestSteelK, coldestAfterwardsK: leastK };

  const at = stateFinder(end);
  const energyJ = (T: number): number => totalMolesMol * at(T).internalEnergyJPerMol + wall.energyAtJ(T);
  const whole = end.internalEnergyJ + wall.energyAtJ(wallMeanK);
  const evenK = evenTemperature(
    (T) => energyJ(T) - whole,
    Math.min(end.temperatureK, wallMeanK),
    Math.max(end.temperatureK, wallMeanK),
  );
  const coldestAfterwardsK = Math.min(coldestSteelK, evenK);
  const known = { ratedTemperatureK, coldestAtStopK: coldestSteelK, coldestAfterwardsK };
  if (coldestAfterwardsK >= ratedTemperatureK) return { state: "already-above", ...known };
  if (ambientK <= ratedTemperatureK) return { state: "never", ...known };

  const insulation = vessel.wall?.insulation;
  const resistance = 1 / coefficientWPerM2K + (insulation ? insulation.thicknessM / insulation.conductivityWPerMK : 0);
  const conductanceWPerK = areaM2 / resistance;
  let timeS = 0;
  let [T, E] = [coldestAfterwardsK, energyJ(coldestAfterwardsK)];
  for (let i = 1; i <= pieces; i++) {
    const next = coldestAfterwardsK + ((ratedTemperatureK - coldestAfterwardsK) * i) / pieces;
    const nextE = energyJ(next);
    timeS += (((nextE - E) / (next - T)) * Math.log((ambientK - T) / (ambientK - next))) / conductanceWPerK;
    [T, E] = [next, nextE];
  }
  return { state: "rewarms", ...known, timeS, lowS: (1 - timeBand) * timeS, highS: (1 + timeBand) * timeS };
}

/** Fluid and steel meet between their two temperatures, and a little beyond where mixing within the fluid takes up heat. */
function evenTemperature(excess: (T: number) => number, low: number, high: number): number {
  let [a, b] = [low - 0.01, high + 0.01];
  let [fa, fb] = [excess(a), excess(b)];
  for (let i = 0; i < 12 && fa > 0; i++) fa = excess((a -= 2 ** i));
  for (let i = 0; i < 12 && fb < 0; i++) fb = excess((b += 2 ** i));
  if (!(fa <= 0 && fb >= 0)) throw new EngineError("no-convergence", "Fluid and steel were not found to even out.");
  return bracketedRoot(excess, { a, fa, b, fb }, 1e-9 * b);
}

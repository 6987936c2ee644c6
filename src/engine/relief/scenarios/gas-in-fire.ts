/**
 * Fire on a gas-filled vessel: the gas expands at constant volume to the relieving pressure, at the temperature that the equation of state
 * gives; the rate by the published form, with the ideal-gas temperature T_n p1/p_n for comparison in the basis.
 *
 * Source   API Std 521, unwetted vessels
 * Throws   EngineError "not-applicable" where the gas would be hotter than the wall before it relieves
 */
import type { FeedState } from "../../cases/relief-case";
import { dryWallCaution } from "../../cautions";
import { EngineError } from "../../errors";
import { flashPT } from "../../flash/flash-pt";
import { unwettedReliefKgPerS } from "../../heat/fire-laws";
import { bracketedRoot } from "../../flash/bracketed-root";
import type { Relieving, ReliefStream } from "../relief-stream";

export function gasInFire(
  { fluid, relievingPressurePa }: Relieving,
  { exposedAreaM2, wallTemperatureK, normal }: { exposedAreaM2: number; wallTemperatureK: number; normal: FeedState },
): ReliefStream {
  const before = flashPT(fluid, normal);
  if (before.phases.length > 1 || before.phase === "liquid") {
    throw new EngineError(
      "not-applicable",
      'The vessel holds liquid at its normal state, so it is wetted. Use "fire-wetted".',
      {},
      "relief.normal",
    );
  }
  const temperatureK = heatedToPressure(
    fluid,
    before.molarVolumeM3PerMol,
    relievingPressurePa,
    normal.temperatureK,
    wallTemperatureK,
  );
  const state = flashPT(fluid, { temperatureK, pressurePa: relievingPressurePa });
  const massFlowKgPerS = unwettedReliefKgPerS({
    molarMassKgPerMol: fluid.mixtureMolarMass(fluid.feed),
    relievingPressurePa,
    relievingTemperatureK: temperatureK,
    wallTemperatureK,
    exposedAreaM2,
  });
  const ideal = (normal.temperatureK * relievingPressurePa) / normal.pressurePa;
  return {
    massFlowKgPerS,
    basis: `Gas expansion in fire by API Std 521 on ${exposedAreaM2} m² with the wall at ${wallTemperatureK} K; the gas relieves at ${temperatureK.toFixed(1)} K (ideal gas: ${ideal.toFixed(1)} K).`,
    state,
    composition: fluid.feed,
    warnings: [dryWallCaution],
  };
}

/** Temperature at which the gas, closed in at its volume, reaches the pressure. */
function heatedToPressure(
  fluid: Relieving["fluid"],
  molarVolume: number,
  pressurePa: number,
  fromK: number,
  wallK: number,
): number {
  const excess = (T: number): number =>
    Math.log(fluid.phaseAtPressure(T, pressurePa, fluid.feed, "stable").molarVolumeM3PerMol / molarVolume);
  const [low, high] = [excess(fromK), excess(wallK)];
  if (low >= 0) return fromK;
  if (high < 0) {
    throw new EngineError(
      "not-applicable",
      `The gas would have to be hotter than the wall, ${wallK} K, to reach the relieving pressure: the vessel fails before it relieves.`,
      { wallK },
      "relief.wallTemperatureK",
    );
  }
  return bracketedRoot(excess, { a: fromK, fa: low, b: wallK, fb: high }, { within: 1e-9, what: "relieving temperature" });
}

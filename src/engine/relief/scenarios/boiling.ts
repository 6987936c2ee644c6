/**
 * Liquid that boils at the relieving pressure: fire on a wetted vessel, or a given heat load.
 *
 *   W = Q/h_fg;  for a mixture h_fg is the heat of the first vapour that forms, over its mass: [H(β) − H(0)]/(β M_v) as β → 0
 *
 * Source   API Std 521: relief rate from the latent heat at relieving composition
 * Holds    below the critical region; the vapour that forms is lighter than the liquid, so the rate may rise later in the fire
 * Throws   EngineError "not-applicable" where the fluid does not boil at this pressure
 */
import { EngineError } from "../../errors";
import type { Equilibrium } from "../../flash/equilibrium";
import { flashPQ } from "../../flash/flash-quality";
import { flashPT } from "../../flash/flash-pt";
import type { Relieving, ReliefStream } from "../relief-stream";

/** Vapour fraction over which the first vapour's heat is taken. */
const firstVapour = 1e-3;
/** Below this the latent heat says little and the transient is asked for (API Std 521, from memory). */
const leastLatentHeatJPerKg = 115e3;

export function boiling({ fluid, relievingPressurePa: pressurePa }: Relieving, heatW: number, basis: string): ReliefStream {
  const before = bubble(fluid, pressurePa);
  const after = flashPQ(fluid, { pressurePa, vapourMoleFraction: firstVapour });
  const vapour = after.phases.find(({ kind }) => kind !== "liquid") ?? after.phases[0];
  if (!vapour) throw new EngineError("no-convergence", "No vapour was found at the relieving pressure.", { pressurePa });
  const vapourKg = firstVapour * fluid.mixtureMolarMass(vapour.composition);
  const latentHeatJPerKg = (after.enthalpyJPerMol - before.enthalpyJPerMol) / vapourKg;
  const composition = vapour.composition;
  return {
    massFlowKgPerS: heatW / latentHeatJPerKg,
    basis,
    heatW,
    latentHeatJPerKg,
    composition,
    state: flashPQ(fluid, { pressurePa, vapourMoleFraction: 1 }, composition),
    warnings:
      latentHeatJPerKg < leastLatentHeatJPerKg
        ? [
            `The latent heat is ${Math.round(latentHeatJPerKg / 1000)} kJ/kg, near the critical region: the rate is uncertain. Run the fire as a blowdown with a relief device instead.`,
          ]
        : [],
  };
}

function bubble(fluid: Relieving["fluid"], pressurePa: number): Equilibrium {
  try {
    return flashPQ(fluid, { pressurePa, vapourMoleFraction: 0 });
  } catch (error) {
    if (!(error instanceof EngineError)) throw error;
    throw new EngineError(
      "not-applicable",
      `The fluid does not boil at the relieving pressure of ${Math.round(pressurePa)} Pa, which is above its critical region. Run the fire as a blowdown with a relief device instead.`,
      { pressurePa },
      "device.setPressureGaugePa",
    );
  }
}

/** Blocked-in liquid at a temperature, at the relieving pressure. */
export function liquidAt({ fluid, relievingPressurePa }: Relieving, temperatureK: number): Equilibrium {
  const state = flashPT(fluid, { temperatureK, pressurePa: relievingPressurePa });
  if (state.phase !== "liquid") {
    throw new EngineError(
      "not-applicable",
      `At ${temperatureK} K and the relieving pressure the fluid is not a liquid. For vapour that forms use "heat-load".`,
      { temperatureK },
      "relief.temperatureK",
    );
  }
  return state;
}

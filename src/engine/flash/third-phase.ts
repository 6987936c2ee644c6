import type { FluidModel } from "../eos/fluid-model";
import type { Equilibrium } from "./equilibrium";
import { testStability } from "./stability";
import { furtherSearches, mostMixed } from "./verify-phases";

/** A tangent-plane distance this small is the round-off of phases that have just been found equal. */
const missing = -1e-7;

/** Would a phase of this two-phase equilibrium split again? Throws "no-convergence" when the test itself fails. */
export function splitsFurther(model: FluidModel, { temperatureK, pressurePa, phases }: Equilibrium): boolean {
  const [light, dense] = phases;
  if (!light || !dense) return false;
  const tested = mostMixed([dense.composition, light.composition]);
  const partner = tested === dense.composition ? light.composition : dense.composition;
  const searches = furtherSearches(model, tested);
  return testStability(model, temperatureK, pressurePa, tested, { partner, searches }).tangentPlaneDistance < missing;
}

/** Water is what makes a third phase out of ordinary fluids. */
export function mayHoldWater(model: FluidModel, z: ArrayLike<number>): boolean {
  const water = model.componentIds.indexOf("water");
  return water >= 0 && z[water]! > 0;
}

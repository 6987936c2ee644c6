/** Is the one phase that a segment follows still the stable one? A failed test throws: it is never read as an answer. */
import type { FluidModel } from "../../eos/fluid-model";
import { createPhaseState } from "../../eos/fluid-model";
import { insideDome } from "../../flash/pure-volume";
import { onlyComponent } from "../../flash/saturation-pure";
import type { Contents } from "./contents";

const scratch = createPhaseState();

export function isStableAlone(fluid: FluidModel, { temperatureK, pressurePa, composition, lightest }: Contents): boolean {
  if (!(pressurePa > 0) || !(lightest.pressureByVolume < 0)) return false;
  // A pure fluid has no other composition to split into: what tells is whether its volume lies between the saturated ones.
  if (onlyComponent(composition) >= 0)
    return insideDome(fluid, temperatureK, lightest.molarVolumeM3PerMol, composition) === undefined;
  // Of several roots the stable one must be ours.
  const { molarVolumeM3PerMol } = fluid.phaseAtPressure(temperatureK, pressurePa, composition, "stable", scratch);
  if (Math.abs(molarVolumeM3PerMol / lightest.molarVolumeM3PerMol - 1) > 1e-6) return false;
  return fluid.stability(temperatureK, pressurePa, composition).stable;
}

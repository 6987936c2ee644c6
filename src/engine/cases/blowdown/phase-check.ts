/** Is the one phase that a segment follows still the stable one? A failed test throws: it is never read as an answer. */
import type { FluidModel } from "../../eos/fluid-model";
import { createPhaseState } from "../../eos/fluid-model";
import type { Contents } from "./contents";

const scratch = createPhaseState();

export function isStableAlone(fluid: FluidModel, { temperatureK, pressurePa, composition, outlet }: Contents): boolean {
  if (!(pressurePa > 0) || !(outlet.pressureByVolume < 0)) return false;
  // Of several roots the stable one must be ours: a pure fluid past its saturation line shows itself only here.
  const { molarVolumeM3PerMol } = fluid.phaseAtPressure(temperatureK, pressurePa, composition, "stable", scratch);
  if (Math.abs(molarVolumeM3PerMol / outlet.molarVolumeM3PerMol - 1) > 1e-6) return false;
  return fluid.stability(temperatureK, pressurePa, composition).stable;
}

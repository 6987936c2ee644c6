/**
 * Equilibrium at given temperature and molar volume: what a closed rigid vessel holds once everything in it has that temperature.
 *
 * A pure fluid inside its dome has a vapour fraction that pressure cannot tell, so it goes by the lever rule on the saturated volumes.
 * Returns  one phase, or vapour and liquid
 * Throws   EngineError "no-convergence"
 */
import type { FluidModel } from "../eos/fluid-model";
import type { Equilibrium } from "../flash/equilibrium";
import { equilibriumAtVolume } from "../flash/equilibrium-at-volume";
import { flashTQ } from "../flash/flash-quality";
import { insideDome } from "../flash/pure-volume";
import { onlyComponent } from "../flash/saturation-pure";

export function flashTV(
  fluid: FluidModel,
  { temperatureK, molarVolumeM3PerMol: v }: { temperatureK: number; molarVolumeM3PerMol: number },
  z: ArrayLike<number> = fluid.feed,
  seed?: Equilibrium,
): Equilibrium {
  if (onlyComponent(z) < 0) return equilibriumAtVolume(fluid, temperatureK, v, z, seed);
  const dome = insideDome(fluid, temperatureK, v, z);
  if (!dome) return equilibriumAtVolume(fluid, temperatureK, v, z);
  const vapourMoleFraction = (v - dome.liquidVolume) / (dome.vapourVolume - dome.liquidVolume);
  return flashTQ(fluid, { temperatureK, vapourMoleFraction }, z);
}

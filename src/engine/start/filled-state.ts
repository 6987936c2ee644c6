/** The equilibrium that two of pressure, temperature and level fix in one vessel. */
import type { StatePair } from "../cases/blowdown-case";
import type { FluidModel } from "../eos/fluid-model";
import { EngineError } from "../errors";
import type { Equilibrium } from "../flash/equilibrium";
import { flashPT } from "../flash/flash-pt";
import { flashPQ, flashTQ } from "../flash/flash-quality";
import { bracketedRoot } from "../ode/bracketed-root";

/**
 * path     of the state in the case document, for a refusal
 * z        mole fractions
 * Throws   EngineError "not-applicable" where the fluid splits into two liquids; what the flash throws
 */
export function filledState(fluid: FluidModel, start: StatePair, path: string, z: ArrayLike<number> = fluid.feed): Equilibrium {
  const found = "liquidVolumeFraction" in start ? atLevel(fluid, start, path, z) : flashPT(fluid, start, z);
  if (found.phases.length === 2 && found.phases[0]?.kind === "liquid") {
    throw new EngineError(
      "not-applicable",
      "At the start the fluid splits into two liquids, which can't be computed yet. Check the composition.",
      {},
      path,
    );
  }
  return found;
}

type AtLevel = Exclude<StatePair, { pressurePa: number; temperatureK: number }>;

/**
 * The saturated state whose liquid fills the given part of the volume. The part falls from 1 to 0 as the vapour mole fraction rises from
 * bubble to dew point, so the search is over that.
 */
function atLevel(fluid: FluidModel, start: AtLevel, path: string, z: ArrayLike<number>): Equilibrium {
  const wanted = start.liquidVolumeFraction;
  const saturated = (vapourMoleFraction: number): Equilibrium =>
    "temperatureK" in start
      ? flashTQ(fluid, { temperatureK: start.temperatureK, vapourMoleFraction }, z)
      : flashPQ(fluid, { pressurePa: start.pressurePa, vapourMoleFraction }, z);
  const excess = (vapourMoleFraction: number): number => liquidPart(saturated(vapourMoleFraction)) - wanted;
  try {
    if (wanted === 0) return saturated(1);
    if (wanted === 1) return saturated(0);
    return saturated(bracketedRoot(excess, { a: 0, fa: 1 - wanted, b: 1, fb: -wanted }, 1e-15));
  } catch (error) {
    if (error instanceof EngineError && error.path === undefined) throw error.at(path);
    throw error;
  }
}

/** Part of the volume that liquids fill, free water among them. */
function liquidPart({ phases, molarVolumeM3PerMol }: Equilibrium): number {
  const liquids = phases.length > 1 ? phases.slice(1) : phases.filter((phase) => phase.kind === "liquid");
  return (
    liquids.reduce((sum, { moleFraction, state }) => sum + moleFraction * state.molarVolumeM3PerMol, 0) / molarVolumeM3PerMol
  );
}

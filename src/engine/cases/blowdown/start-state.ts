/** The contents at the start: amounts and energy in the given volume, from whichever two of pressure, temperature and level are given. */
import type { FluidModel } from "../../eos/fluid-model";
import { EngineError } from "../../errors";
import type { Equilibrium } from "../../flash/equilibrium";
import { flashPQ, flashTQ } from "../../flash/flash-quality";
import { flashPT } from "../../flash/flash-pt";
import { bracketedRoot } from "../../ode/bracketed-root";
import type { StartSpec } from "../blowdown-case";

export type StartState = {
  temperatureK: number;
  pressurePa: number;
  molesMol: Float64Array;
  totalMolesMol: number;
  internalEnergyJ: number;
  twoPhase: boolean;
};

export function startState(fluid: FluidModel, start: StartSpec, volumeM3: number): StartState {
  const found = "liquidVolumeFraction" in start ? atLevel(fluid, start) : flashPT(fluid, start);
  if (found.phases.length === 2 && found.phases[0]?.kind === "liquid") {
    throw new EngineError(
      "not-applicable",
      "At the start the fluid splits into two liquids, which can't be computed yet. Check the composition.",
      {},
      "start",
    );
  }
  const total = volumeM3 / found.molarVolumeM3PerMol;
  return {
    temperatureK: found.temperatureK,
    pressurePa: found.pressurePa,
    molesMol: fluid.feed.map((z) => z * total),
    totalMolesMol: total,
    internalEnergyJ: total * found.internalEnergyJPerMol,
    twoPhase: found.phases.length === 2,
  };
}

/**
 * The saturated state whose liquid fills the given part of the volume. The part falls from 1 to 0 as the vapour mole fraction rises from
 * bubble to dew point, so the search is over that.
 */
function atLevel(fluid: FluidModel, start: Exclude<StartSpec, { pressurePa: number; temperatureK: number }>): Equilibrium {
  const wanted = start.liquidVolumeFraction;
  const saturated = (vapourMoleFraction: number): Equilibrium =>
    "temperatureK" in start
      ? flashTQ(fluid, { temperatureK: start.temperatureK, vapourMoleFraction })
      : flashPQ(fluid, { pressurePa: start.pressurePa, vapourMoleFraction });
  const excess = (vapourMoleFraction: number): number => liquidPart(saturated(vapourMoleFraction)) - wanted;
  try {
    if (wanted === 0) return saturated(1);
    if (wanted === 1) return saturated(0);
    return saturated(bracketedRoot(excess, { a: 0, fa: 1 - wanted, b: 1, fb: -wanted }, 1e-15));
  } catch (error) {
    if (error instanceof EngineError && error.path === undefined) throw error.at("start");
    throw error;
  }
}

function liquidPart({ phases, molarVolumeM3PerMol }: Equilibrium): number {
  const dense = phases.length === 2 ? phases[1] : phases.find((phase) => phase.kind === "liquid");
  return dense ? (dense.moleFraction * dense.state.molarVolumeM3PerMol) / molarVolumeM3PerMol : 0;
}

import type { FlashCase, FlashPhase, FlashResult } from "../cases/flash-case";
import { createFluidModel } from "../eos/create-fluid-model";
import type { FluidModel } from "../eos/fluid-model";
import { stateWarnings } from "../eos/state-warnings";
import { solidWarnings } from "../solids/solid-warnings";
import type { Equilibrium, EquilibriumPhase } from "./equilibrium";
import { flashPH, flashPS } from "./flash-ph";
import { flashPT } from "./flash-pt";
import { flashPQ, flashTQ } from "./flash-quality";
import { flashUV } from "./flash-uv";
import { phaseWarnings } from "./phase-warnings";
import { summarise } from "./summarise";

/** kind "flash". Throws EngineError with the path of the field where one field is at fault. */
export function runFlash(document: FlashCase): FlashResult {
  const model = createFluidModel(document.fluid);
  const state = solve(model, document);
  const single = state.phases.length === 1 ? state.phases[0]! : undefined;
  return {
    format: "ebbmark-result/1",
    kind: "flash",
    state: {
      ...summarise(model, state),
      internalEnergyJPerMol: state.internalEnergyJPerMol,
      enthalpyJPerMol: state.enthalpyJPerMol,
      entropyJPerMolK: state.entropyJPerMolK,
      densityKgPerM3: model.mixtureMolarMass(model.feed) / state.molarVolumeM3PerMol,
      ...(single ? { soundSpeedMPerS: single.state.soundSpeedMPerS } : {}),
    },
    phases: state.phases.map((phase) => describe(model, phase)),
    warnings: [...phaseWarnings(model, state), ...solidWarnings(model, state), ...stateWarnings(model, [state.temperatureK])],
  };
}

function solve(model: FluidModel, document: FlashCase): Equilibrium {
  switch (document.specification) {
    case "PT":
      return flashPT(model, document);
    case "PH":
      return flashPH(model, document);
    case "PS":
      return flashPS(model, document);
    case "UV":
      return flashUV(model, document);
    case "TQ":
      return flashTQ(model, document);
    case "PQ":
      return flashPQ(model, document);
  }
}

function describe(
  model: FluidModel,
  { kind, moleFraction, composition, state, lnFugacityCoefficients }: EquilibriumPhase,
): FlashPhase {
  const byId = (values: Float64Array) => Object.fromEntries(model.componentIds.map((id, i) => [id, values[i]!]));
  return {
    kind,
    moleFraction,
    composition: byId(composition),
    compressibility: state.compressibility,
    densityKgPerM3: state.densityKgPerM3,
    fugacityCoefficients: byId(lnFugacityCoefficients.map(Math.exp)),
  };
}

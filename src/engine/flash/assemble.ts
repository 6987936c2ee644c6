import { createPhaseState, type FluidModel } from "../eos/fluid-model";
import { createResidualDerivatives } from "../eos/residual-derivatives";
import { classifyPhase } from "./classify-phase";
import type { Equilibrium, EquilibriumPhase } from "./equilibrium";

interface PhaseInput {
  moleFraction: number;
  composition: ArrayLike<number>;
  molarVolume: number;
}

/** Below this molar volume over the smallest one possible, even the lighter of two phases is a liquid. */
const liquidPacking = 1.9;

/** An `Equilibrium` from the temperature, the pressure and the phases that a flash has found. */
export function assemble(model: FluidModel, T: number, p: number, inputs: readonly PhaseInput[]): Equilibrium {
  const phases = inputs.map((input) => assemblePhase(model, T, p, input));
  if (phases.length > 1) {
    phases.sort((a, b) => b.state.molarVolumeM3PerMol - a.state.molarVolumeM3PerMol);
    const [light, ...dense] = phases as [EquilibriumPhase, ...EquilibriumPhase[]];
    model.residual.setComposition(light.composition);
    const packed = light.state.molarVolumeM3PerMol < liquidPacking * model.residual.minimumVolume();
    light.kind = packed ? "liquid" : "vapour";
    for (const phase of dense) phase.kind = "liquid";
  }
  const result: Equilibrium = {
    temperatureK: T,
    pressurePa: p,
    molarVolumeM3PerMol: 0,
    internalEnergyJPerMol: 0,
    enthalpyJPerMol: 0,
    entropyJPerMolK: 0,
    vapourMoleFraction: 0,
    phase: phases.length > 1 ? "two-phase" : phases[0]!.kind,
    phases,
  };
  for (const { moleFraction, state, kind } of phases) {
    result.molarVolumeM3PerMol += moleFraction * state.molarVolumeM3PerMol;
    result.internalEnergyJPerMol += moleFraction * state.internalEnergyJPerMol;
    result.enthalpyJPerMol += moleFraction * state.enthalpyJPerMol;
    result.entropyJPerMolK += moleFraction * state.entropyJPerMolK;
    if (kind !== "liquid") result.vapourMoleFraction += moleFraction;
  }
  return result;
}

function assemblePhase(model: FluidModel, T: number, p: number, input: PhaseInput): EquilibriumPhase {
  const { moleFraction, molarVolume } = input;
  const composition =
    input.composition instanceof Float64Array ? input.composition.slice() : Float64Array.from(input.composition);
  const state = model.phaseAtVolume(T, molarVolume, composition, createPhaseState());
  state.enthalpyJPerMol += (p - state.pressurePa) * molarVolume;
  state.pressurePa = p;
  const lnFugacityCoefficients = new Float64Array(composition.length);
  lnPhiAtVolume(model, T, p, molarVolume, composition, lnFugacityCoefficients);
  return { kind: classifyPhase(model, T, p, molarVolume, composition), moleFraction, composition, state, lnFugacityCoefficients };
}

function lnPhiAtVolume(model: FluidModel, T: number, p: number, v: number, x: Float64Array, out: Float64Array): void {
  const scratch = model.residual;
  scratch.setComposition(x);
  const F = derivativesFor(x.length);
  scratch.evaluate(T, v, 1, F);
  const lnZ = Math.log((p * v) / (model.gasConstantJPerMolK * T));
  for (let i = 0; i < x.length; i++) out[i] = F.Fn[i]! - lnZ;
}

const scratches = new Map<number, ReturnType<typeof createResidualDerivatives>>();
function derivativesFor(count: number) {
  let found = scratches.get(count);
  if (!found) scratches.set(count, (found = createResidualDerivatives(count)));
  return found;
}

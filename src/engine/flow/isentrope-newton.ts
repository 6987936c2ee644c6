/**
 * The throat of a frozen nozzle by Newton steps in temperature and volume at once, from a first guess near by.
 *
 *   unknown x = ln(v/v0) and T;  s(T, v) = s0 to first order at each step:  ln T ← ln T − (s − s0)/cv,  h ← h − (T + v T p_T/cv)(s − s0)
 *   sonic     h0 − h − M c²/2 = 0        pressure   ln(p/p_wanted) = 0, p ← p − T p_T (s − s0)/cv
 *
 * Two or three evaluations of the equation of state, where a search for T at each x takes ten. A guess changes the cost and not the answer; where
 * the steps leave the phase or do not settle the caller searches from scratch.
 *
 * Source   the conditions of `frozen-nozzle.ts`; derivatives by (∂h/∂s)_v = T + v (∂p/∂s)_v, (∂p/∂s)_v = T p_T/cv, (∂ln T/∂ln v)_s = −v p_T/cv
 */
import { createPhaseState, type FluidModel, type PhaseState } from "../eos/fluid-model";
import { EngineError } from "../errors";

/** Where a throat was last found, relative to stagnation: ln(v/v0), ln(T/T0). */
export type ThroatHint = { x: number; lnT: number };

export type FrozenThroat = {
  x: number;
  fluxKgPerM2S: number;
  pressurePa: number;
  temperatureK: number;
};

const settled = 1e-9;
const mostSteps = 12;
const scratch = createPhaseState();

/** M c² [J/mol] = −v² (∂p/∂v)_s */
export function soundTerm(state: PhaseState): number {
  const v = state.molarVolumeM3PerMol;
  const pT = state.pressureByTemperature;
  return v * v * ((state.temperatureK * pT * pT) / state.heatCapacityVJPerMolK - state.pressureByVolume);
}

/**
 * wantedPressurePa  the pressure to reach; undefined for the sonic point
 * hint              start of the steps; set to the place found
 * Returns  the throat, or undefined where the steps fail
 */
export function throatByNewton(
  model: FluidModel,
  stagnation: PhaseState,
  z: ArrayLike<number>,
  wantedPressurePa: number | undefined,
  hint: ThroatHint,
): FrozenThroat | undefined {
  const T0 = stagnation.temperatureK;
  const v0 = stagnation.molarVolumeM3PerMol;
  const h0 = stagnation.enthalpyJPerMol;
  const s0 = stagnation.entropyJPerMolK;
  const R = model.gasConstantJPerMolK;
  let x = hint.x;
  let T = T0 * Math.exp(hint.lnT);
  let lastX = Number.NaN;
  let lastExcess = Number.NaN;
  for (let i = 0; i < mostSteps; i++) {
    if (!(x > 0 && x < 6 && T > 0)) return undefined;
    const v = v0 * Math.exp(x);
    if (!evaluate(model, T, v, z)) return undefined;
    const cv = scratch.heatCapacityVJPerMolK;
    const pT = scratch.pressureByTemperature;
    const sound = soundTerm(scratch);
    if (!(sound > 0 && cv > 0 && scratch.pressurePa > 0)) return undefined;
    const ds = scratch.entropyJPerMolK - s0;
    const onIsentropeT = T * Math.exp(-ds / cv);
    const h = scratch.enthalpyJPerMol - (T + (v * T * pT) / cv) * ds;
    const p = scratch.pressurePa - (T * pT * ds) / cv;
    let step: number;
    if (wantedPressurePa === undefined) {
      const excess = h0 - h - sound / 2;
      const k = sound / (p * v);
      const secant = (excess - lastExcess) / (x - lastX);
      const slope = secant > 0.3 * sound && secant < 4 * sound ? secant : sound * (1 + Math.max(k - 1, 0) / 2);
      lastX = x;
      lastExcess = excess;
      step = -excess / slope;
    } else {
      step = (Math.log(p / wantedPressurePa) * p * v) / sound;
    }
    if (Math.abs(step) < settled && Math.abs(ds) < 1e-7 * R) {
      hint.x = x;
      hint.lnT = Math.log(onIsentropeT / T0);
      // What is left of the step changes the flux at a maximum by its square; at a given pressure by v dp.
      const moved = wantedPressurePa === undefined ? 0 : step;
      const kinetic = h0 - h + sound * moved;
      if (!(kinetic >= 0)) return undefined;
      const molarMass = scratch.densityKgPerM3 * v;
      return {
        x,
        fluxKgPerM2S: scratch.densityKgPerM3 * (1 - moved) * Math.sqrt((2 * kinetic) / molarMass),
        pressurePa: wantedPressurePa ?? p * (1 - (sound / (p * v)) * step),
        temperatureK: onIsentropeT,
      };
    }
    if (!Number.isFinite(step) || Math.abs(step) > 1) return undefined;
    x += step;
    T = onIsentropeT * Math.exp((-v * pT * step) / cv);
  }
  return undefined;
}

function evaluate(model: FluidModel, T: number, v: number, z: ArrayLike<number>): boolean {
  try {
    model.phaseAtVolume(T, v, z, scratch);
    return true;
  } catch (error) {
    if (error instanceof EngineError && error.code !== "cancelled") return false;
    throw error;
  }
}

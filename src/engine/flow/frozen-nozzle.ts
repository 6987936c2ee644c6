/**
 * Mass flux of an ideal nozzle whose fluid keeps its one phase and its composition (frozen flow).
 *
 *   G = max over v ≥ v0 of ρ √(2 (h0 − h)) at s = s0, p ≥ p_back; at the maximum the velocity is the speed of sound
 *
 * The throat is the first root of h0 − h − c²/2 = 0 along the isentrope, walked in x = ln(v/v0), into the metastable region if need be.
 * A fluid that reaches the back pressure first flows at the back pressure (not choked; a liquid in frozen flow always does).
 * A gas is tried by Newton steps from the last throat (`isentrope-newton.ts`) and searched for from scratch where they fail. A guess changes the
 * answer by round-off only.
 *
 * Source   one-dimensional isentropic flow: dG = 0 where the velocity equals the speed of sound (any text on gas dynamics)
 * Holds    steady, isentropic, no discharge coefficient; a throat where the fluid would condense is followed on the metastable branch
 * stagnation  state of the stream at rest; z its composition
 * hints    throats found before, for streams near by: seeds only
 * Returns  G [kg/(m² s)] and the throat; zero flux where the back pressure is not below the stagnation pressure
 * Throws   EngineError "no-convergence"
 */
import { createPhaseState, type FluidModel, type PhaseState } from "../eos/fluid-model";
import { EngineError } from "../errors";
import { soundTerm, throatByNewton, type FrozenThroat, type ThroatHint } from "./isentrope-newton";

export type NozzleFlow = { massFluxKgPerM2S: number; throatPressurePa: number; throatTemperatureK: number; choked: boolean };

const convergedInX = 1e-11;

export function frozenNozzle(
  model: FluidModel,
  stagnation: PhaseState,
  z: ArrayLike<number>,
  backPressurePa: number,
  hints: NozzleHints = createNozzleHints(),
): NozzleFlow {
  const { pressurePa: p0, temperatureK: T0 } = stagnation;
  if (!(backPressurePa < p0)) return { massFluxKgPerM2S: 0, throatPressurePa: p0, throatTemperatureK: T0, choked: false };
  const quick = quickly(model, stagnation, z, backPressurePa, hints);
  if (quick) return quick;

  const walk = new Isentrope(model, stagnation, z);
  const sonic = sonicPoint(walk);
  if (sonic !== undefined && walk.at(sonic).pressurePa > backPressurePa) return flowAt(walk, sonic, true);
  return flowAt(walk, pressurePoint(walk, backPressurePa, sonic), false);
}

export type NozzleHints = { sonic: ThroatHint; subsonic: ThroatHint };
export const createNozzleHints = (): NozzleHints => ({ sonic: { x: 0, lnT: 0 }, subsonic: { x: 0, lnT: 0 } });

/** Gas-like streams have one throat only; a dense one may have more, of which the first counts. */
const gasLike = { leastCompressibility: 0.45, least: 0.8, most: 2.2 };

function quickly(
  model: FluidModel,
  stagnation: PhaseState,
  z: ArrayLike<number>,
  backPressurePa: number,
  hints: NozzleHints,
): NozzleFlow | undefined {
  const { pressurePa: p0, molarVolumeM3PerMol: v0 } = stagnation;
  const k = soundTerm(stagnation) / (p0 * v0);
  if (!(stagnation.compressibility > gasLike.leastCompressibility && k > gasLike.least && k < gasLike.most)) return undefined;
  const gruneisen = (v0 * stagnation.pressureByTemperature) / stagnation.heatCapacityVJPerMolK;
  const start = (hint: ThroatHint, x: number): void => {
    if (hint.x > 0 && Math.abs(hint.x - x) < 0.3 * x) return;
    hint.x = x;
    hint.lnT = -gruneisen * x;
  };
  start(hints.sonic, Math.abs(k - 1) < 1e-6 ? 0.5 : Math.log((k + 1) / 2) / (k - 1));
  const sonic = throatByNewton(model, stagnation, z, undefined, hints.sonic);
  if (!sonic) return undefined;
  if (sonic.pressurePa > backPressurePa) return flowOf(sonic, true);
  start(hints.subsonic, Math.log(p0 / backPressurePa) / k);
  const subsonic = throatByNewton(model, stagnation, z, backPressurePa, hints.subsonic);
  return subsonic && subsonic.x <= sonic.x * (1 + 1e-9) ? flowOf(subsonic, false) : undefined;
}

const flowOf = ({ fluxKgPerM2S, pressurePa, temperatureK }: FrozenThroat, choked: boolean): NozzleFlow => ({
  massFluxKgPerM2S: fluxKgPerM2S,
  throatPressurePa: pressurePa,
  throatTemperatureK: temperatureK,
  choked,
});

/** The isentrope through a stagnation state by x = ln(v/v0); `at` gives undefined-free states or says that none exists. */
class Isentrope {
  readonly molarMass: number;
  readonly v0: number;
  readonly h0: number;
  /** κ = −∂ln p/∂ln v at constant entropy, at stagnation. */
  readonly exponent: number;
  private readonly T0: number;
  private readonly s0: number;
  private readonly gruneisen: number;
  private readonly out = createPhaseState();

  constructor(
    private readonly model: FluidModel,
    stagnation: PhaseState,
    private readonly z: ArrayLike<number>,
  ) {
    this.molarMass = model.mixtureMolarMass(z);
    this.v0 = stagnation.molarVolumeM3PerMol;
    this.h0 = stagnation.enthalpyJPerMol;
    this.T0 = stagnation.temperatureK;
    this.s0 = stagnation.entropyJPerMolK;
    this.exponent = soundTerm(stagnation) / (stagnation.pressurePa * this.v0);
    this.gruneisen = (this.v0 * stagnation.pressureByTemperature) / stagnation.heatCapacityVJPerMolK;
  }

  at(x: number): PhaseState {
    if (x === 0) return this.model.phaseAtVolume(this.T0, this.v0, this.z, this.out);
    return this.model.phaseFromEntropyVolume(
      this.s0,
      this.v0 * Math.exp(x),
      this.z,
      this.T0 * Math.exp(-this.gruneisen * x),
      this.out,
    );
  }

  /** State at x if the phase can be there: positive pressure and a real speed of sound. */
  tenableAt(x: number): PhaseState | undefined {
    try {
      const state = this.at(x);
      return state.pressurePa > 0 && soundTerm(state) > 0 ? state : undefined;
    } catch (error) {
      if (error instanceof EngineError && error.code !== "cancelled") return undefined;
      throw error;
    }
  }
}

/** First x at which the velocity reaches the speed of sound, or undefined where the phase ends before that. */
function sonicPoint(walk: Isentrope): number | undefined {
  const k = walk.exponent;
  if (!(k > 0))
    throw new EngineError(
      "no-convergence",
      "The stream before the nozzle has no real speed of sound: it is not one stable phase.",
    );
  const excess = (state: PhaseState): number => walk.h0 - state.enthalpyJPerMol - soundTerm(state) / 2;

  let low = 0;
  let high = Number.POSITIVE_INFINITY;
  let x = Math.abs(k - 1) < 1e-6 ? 0.5 : Math.log((k + 1) / 2) / (k - 1);
  let before: { x: number; excess: number } | undefined;
  for (let i = 0; i < 80; i++) {
    const state = walk.tenableAt(x);
    if (!state) {
      high = x;
      before = undefined;
      x = (low + high) / 2;
      if (high - low < 1e-9 * high) return undefined;
      continue;
    }
    const now = excess(state);
    if (now < 0) low = x;
    else high = x;
    // d(excess)/dx = M c² − M c dc/dx; with c² ~ v^-(κ−1) nearly. A secant of two points replaces the guess.
    const slope =
      before && before.x !== x ? (now - before.excess) / (x - before.x) : soundTerm(state) * (1 + Math.max(k - 1, 0) / 2);
    before = { x, excess: now };
    const step = -now / slope;
    if (Math.abs(step) < convergedInX * Math.max(x, 1e-3)) return x + step;
    let next = x + step;
    if (!(slope > 0) || next <= low || next >= high) next = high === Number.POSITIVE_INFINITY ? x * 1.6 : (low + high) / 2;
    if (high - low < 1e-14 * high) return x;
    x = next;
    if (x > 12) return undefined;
  }
  throw new EngineError("no-convergence", "The throat of the nozzle could not be found.", { exponent: k });
}

/** x at which the isentrope reaches a pressure; it falls all the way from stagnation to the sonic point. */
function pressurePoint(walk: Isentrope, pressurePa: number, sonic: number | undefined): number {
  const p0 = walk.at(0).pressurePa;
  let low = 0;
  let high = sonic ?? Number.POSITIVE_INFINITY;
  let x = Math.min(Math.log(p0 / pressurePa) / walk.exponent, sonic ?? Number.POSITIVE_INFINITY);
  for (let i = 0; i < 200; i++) {
    const state = walk.tenableAt(x);
    if (!state) high = x;
    else {
      const ratio = Math.log(state.pressurePa / pressurePa);
      if (ratio > 0) low = x;
      else high = x;
      const step = (ratio * state.pressurePa * state.molarVolumeM3PerMol) / soundTerm(state);
      if (Math.abs(step) < convergedInX * Math.max(x, 1e-9)) return x + step;
      const next = x + step;
      if (next > low && next < high) {
        x = next;
        continue;
      }
    }
    x = high === Number.POSITIVE_INFINITY ? x * 2 + 1e-6 : (low + high) / 2;
    if (high - low <= 1e-15 * high) return x;
  }
  throw new EngineError("no-convergence", "The throat at the back pressure could not be found.", { backPressurePa: pressurePa });
}

function flowAt(walk: Isentrope, x: number, choked: boolean): NozzleFlow {
  const state = walk.at(x);
  const kinetic = Math.max(walk.h0 - state.enthalpyJPerMol, 0);
  return {
    massFluxKgPerM2S: state.densityKgPerM3 * Math.sqrt((2 * kinetic) / walk.molarMass),
    throatPressurePa: state.pressurePa,
    throatTemperatureK: state.temperatureK,
    choked,
  };
}

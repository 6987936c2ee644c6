/**
 * Mass flux of an ideal nozzle whose fluid stays in equilibrium: homogeneous, one velocity, condensing or boiling at once.
 *
 *   G = max over p in [p_back, p0] of ρ(p, s0) √(2 (h0 − h(p, s0)))
 *
 * The isentrope is walked in x = ln(v/v0), where energy and volume fix the state even inside the dome of a pure fluid. G(x) has a kink where
 * a phase appears or disappears and may have its maximum there, so the best interval of the walk is closed without derivatives.
 *
 * Source   homogeneous equilibrium model of critical flow (any text on two-phase flow); minimiser: Brent (1973), chapter 5
 * Holds    long throats; a short one boils late and passes more (docs/methods/nozzle.md)
 * stagnation  equilibrium state at rest; z its overall composition
 * Returns  G [kg/(m² s)] and the throat
 * Throws   EngineError "no-convergence"
 */
import { createPhaseState, type FluidModel, type PhaseState } from "../eos/fluid-model";
import { EngineError } from "../errors";
import type { Equilibrium } from "../flash/equilibrium";
import { flashPS } from "../flash/flash-ph";
import { onlyComponent } from "../flash/saturation-pure";
import { createNozzleHints, frozenNozzle, type NozzleFlow, type NozzleHints } from "./frozen-nozzle";
import { mixedThroat, type MixedThroat } from "./mixed-throat";
import { onIsentrope } from "./on-isentrope";
import { pureEquilibriumNozzle, type DomeHints } from "./pure-equilibrium-nozzle";
import { smallestBetween } from "./smallest-between";

/** Places found for streams near by: seeds only, which change the cost and not the answer. */
export type EquilibriumHints = {
  frozen: NozzleHints;
  dome: DomeHints;
  throat: MixedThroat | undefined;
  behind: Equilibrium | undefined;
};
export const createEquilibriumHints = (): EquilibriumHints => ({
  frozen: createNozzleHints(),
  dome: { entry: 0, throat: 0, dome: undefined },
  throat: undefined,
  behind: undefined,
});

type Point = { x: number; flux: number; state: Equilibrium };

const firstStep = 0.02;
const growth = 1.45;
/** Past a maximum the walk ends where the flux has fallen to this part of it: no second maximum higher than the first has been seen beyond. */
const fallen = 0.6;

export function equilibriumNozzle(
  fluid: FluidModel,
  stagnation: Equilibrium,
  z: ArrayLike<number>,
  backPressurePa: number,
  hints: EquilibriumHints = createEquilibriumHints(),
): NozzleFlow {
  const { pressurePa: p0, temperatureK: T0 } = stagnation;
  if (!(backPressurePa < p0)) return { massFluxKgPerM2S: 0, throatPressurePa: p0, throatTemperatureK: T0, choked: false };
  const component = onlyComponent(z);
  const quick = component >= 0 && pureEquilibriumNozzle(fluid, stagnation, z, component, backPressurePa, hints);
  if (quick) return quick;
  const [only, other] = stagnation.phases;
  if (!hints.throat && only && (!other || other.moleFraction < 1e-12)) {
    const frozen = frozenNozzle(fluid, only.state, z, backPressurePa, hints.frozen);
    if (staysOnePhase(fluid, only.state, z, frozen)) return frozen;
  }
  const throat =
    (hints.throat && mixedThroat(fluid, stagnation, z, hints.throat)) ?? walkedThroat(fluid, stagnation, z, backPressurePa);
  hints.throat = throat;

  const molarMass = fluid.mixtureMolarMass(z);
  const fluxOf = (state: Equilibrium): number => fluxAt(stagnation, state, molarMass);
  if (throat.state.pressurePa > backPressurePa)
    return {
      massFluxKgPerM2S: fluxOf(throat.state),
      throatPressurePa: throat.state.pressurePa,
      throatTemperatureK: throat.state.temperatureK,
      choked: true,
    };

  const { entropyJPerMolK } = stagnation;
  const behind = flashPS(fluid, { pressurePa: backPressurePa, entropyJPerMolK }, z, hints.behind ?? throat.state);
  hints.behind = behind;
  return {
    massFluxKgPerM2S: fluxOf(behind),
    throatPressurePa: backPressurePa,
    throatTemperatureK: behind.temperatureK,
    choked: false,
  };
}

const fluxAt = (stagnation: Equilibrium, state: Equilibrium, molarMass: number): number =>
  Math.sqrt(2 * molarMass * Math.max(stagnation.enthalpyJPerMol - state.enthalpyJPerMol, 0)) / state.molarVolumeM3PerMol;

/** From stagnation outwards until the flux has passed its maximum or the pressure the one behind; then the best interval is closed. */
function walkedThroat(fluid: FluidModel, stagnation: Equilibrium, z: ArrayLike<number>, backPressurePa: number): MixedThroat {
  const { molarVolumeM3PerMol: v0, entropyJPerMolK } = stagnation;
  const molarMass = fluid.mixtureMolarMass(z);
  let seed = stagnation;
  const at = (x: number): Point => {
    seed = onIsentrope(fluid, { entropyJPerMolK, molarVolumeM3PerMol: v0 * Math.exp(x) }, z, seed);
    return { x, flux: fluxAt(stagnation, seed, molarMass), state: seed };
  };
  const walk: Point[] = [{ x: 0, flux: 0, state: stagnation }];
  let best = 0;
  for (let step = firstStep * stiffness(stagnation); walk.length < 60; step *= growth) {
    const next = at((walk.at(-1)?.x ?? 0) + step);
    walk.push(next);
    if (next.flux > (walk[best]?.flux ?? 0)) best = walk.length - 1;
    if (next.state.pressurePa <= backPressurePa || next.flux < fallen * (walk[best]?.flux ?? 0)) break;
  }
  const from = walk[Math.max(best - 1, 0)]?.x ?? 0;
  const to = walk[Math.min(best + 1, walk.length - 1)]?.x ?? 0;
  const rough = walk[best]!;
  const closed = best > 0 ? mixedThroat(fluid, stagnation, z, rough) : undefined;
  if (closed && closed.x >= from && closed.x <= to && fluxAt(stagnation, closed.state, molarMass) >= rough.flux) return closed;
  const { x, state } = at(smallestBetween((place) => -at(place).flux, from, to, 1e-7));
  return { x, state };
}

const scratch = createPhaseState();

/** Is the frozen throat a stable single phase, and the half-way pressure too? Then nothing condenses and frozen flow is equilibrium flow. */
function staysOnePhase(
  fluid: FluidModel,
  from: PhaseState,
  z: ArrayLike<number>,
  { throatPressurePa, throatTemperatureK }: NozzleFlow,
): boolean {
  if (!isAlone(fluid, throatTemperatureK, throatPressurePa, from.entropyJPerMolK, z)) return false;
  const middlePa = Math.sqrt(from.pressurePa * throatPressurePa);
  try {
    const { temperatureK } = fluid.phaseFromEntropyPressure(
      from.entropyJPerMolK,
      middlePa,
      z,
      (from.temperatureK + throatTemperatureK) / 2,
      "stable",
      scratch,
    );
    return fluid.stability(temperatureK, middlePa, z).stable;
  } catch (error) {
    if (error instanceof EngineError && error.code === "no-convergence") return false;
    throw error;
  }
}

/** The stable root at (T, p) has the isentrope's entropy, and does not split. */
function isAlone(fluid: FluidModel, T: number, p: number, entropyJPerMolK: number, z: ArrayLike<number>): boolean {
  if (!(p > 0)) return false;
  const stable = fluid.phaseAtPressure(T, p, z, "stable", scratch);
  return Math.abs(stable.entropyJPerMolK - entropyJPerMolK) < 1e-6 * fluid.gasConstantJPerMolK && fluid.stability(T, p, z).stable;
}

/** A liquid loses its pressure in a thousandth of its volume: first steps in proportion to 1/κ, κ = −∂ln p/∂ln v at constant entropy. */
function stiffness({ phases, pressurePa, molarVolumeM3PerMol: v }: Equilibrium): number {
  const [only] = phases;
  if (phases.length !== 1 || !only) return 1;
  const { temperatureK: T, pressureByTemperature: pT, pressureByVolume: pv, heatCapacityVJPerMolK: cv } = only.state;
  const exponent = (v * ((T * pT * pT) / cv - pv)) / pressurePa;
  return Math.min(1, 1.4 / exponent);
}

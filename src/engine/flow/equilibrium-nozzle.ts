/**
 * Mass flux of an ideal nozzle whose fluid stays in equilibrium: homogeneous, one velocity, condensing or boiling at once.
 *
 *   G = max over p in [p_back, p0] of ρ(p, s0) √(2 (h0 − h(p, s0)))
 *
 * Where the frozen throat is a stable single phase all the way, it is the answer. Otherwise G(p) is scanned, because it may have a kink at
 * the bubble or dew pressure and more than one local maximum; the best interval is closed by golden section, which needs no derivative.
 *
 * Source   homogeneous equilibrium model of critical flow (any text on two-phase flow)
 * Holds    long throats; a short one boils late and passes more (see docs/methods/nozzle.md)
 * stagnation  equilibrium state at rest; z its overall composition
 * Returns  G [kg/(m² s)] and the throat
 * Throws   EngineError "no-convergence"
 */
import type { FluidModel } from "../eos/fluid-model";
import type { Equilibrium } from "../flash/equilibrium";
import { flashPS } from "../flash/flash-ph";
import { frozenNozzle, type NozzleFlow } from "./frozen-nozzle";

const golden = (Math.sqrt(5) - 1) / 2;
const scanPoints = 24;

type Point = { pressurePa: number; flux: number; state: Equilibrium };

export function equilibriumNozzle(fluid: FluidModel, stagnation: Equilibrium, z: ArrayLike<number>, backPressurePa: number): NozzleFlow {
  const { pressurePa: p0, temperatureK: T0, enthalpyJPerMol: h0, entropyJPerMolK: s0, phases } = stagnation;
  if (!(backPressurePa < p0)) return { massFluxKgPerM2S: 0, throatPressurePa: p0, throatTemperatureK: T0, choked: false };
  const only = phases.filter((phase) => phase.moleFraction > 1e-12);
  if (only.length === 1 && only[0]) {
    const frozen = frozenNozzle(fluid, only[0].state, z, backPressurePa);
    if (staysOnePhase(fluid, only[0].state, z, frozen.throatPressurePa)) return frozen;
  }

  const molarMass = fluid.mixtureMolarMass(z);
  let seed: Equilibrium | undefined = stagnation;
  const at = (pressurePa: number): Point => {
    const state = flashPS(fluid, { pressurePa, entropyJPerMolK: s0 }, z, seed);
    seed = state;
    const kinetic = Math.max(h0 - state.enthalpyJPerMol, 0);
    return { pressurePa, flux: (molarMass / state.molarVolumeM3PerMol) * Math.sqrt((2 * kinetic) / molarMass), state };
  };
  const scan = Array.from({ length: scanPoints + 1 }, (_, i) => at(p0 * (backPressurePa / p0) ** (i / scanPoints)));
  let best = 0;
  scan.forEach((point, i) => {
    if (point.flux > (scan[best]?.flux ?? 0)) best = i;
  });
  const upper = scan[Math.max(best - 1, 0)]?.pressurePa ?? p0;
  const lower = scan[Math.min(best + 1, scanPoints)]?.pressurePa ?? backPressurePa;
  const throat = largest(at, lower, upper, scan[best]);
  const choked = throat.pressurePa > backPressurePa * (1 + 1e-9);
  return { massFluxKgPerM2S: throat.flux, throatPressurePa: throat.pressurePa, throatTemperatureK: throat.state.temperatureK, choked };
}

/** Stable at the frozen throat and at places on the way to it. */
function staysOnePhase(fluid: FluidModel, from: { pressurePa: number; temperatureK: number; entropyJPerMolK: number }, z: ArrayLike<number>, throatPa: number): boolean {
  let seed: Equilibrium | undefined;
  for (const part of [1, 0.75, 0.5, 0.25]) {
    const pressurePa = from.pressurePa * (throatPa / from.pressurePa) ** part;
    const state = flashPS(fluid, { pressurePa, entropyJPerMolK: from.entropyJPerMolK }, z, seed);
    if (state.phases.length > 1) return false;
    seed = state;
  }
  return true;
}

function largest(at: (p: number) => Point, from: number, to: number, start: Point | undefined): Point {
  let [a, b] = [from, to];
  let c = at(b - golden * (b - a));
  let d = at(a + golden * (b - a));
  let best = start && start.flux > c.flux ? start : c;
  for (let i = 0; i < 60 && b - a > 1e-11 * b; i++) {
    if (c.flux > d.flux) {
      b = d.pressurePa;
      d = c;
      c = at(b - golden * (b - a));
    } else {
      a = c.pressurePa;
      c = d;
      d = at(a + golden * (b - a));
    }
    for (const point of [c, d]) if (point.flux > best.flux) best = point;
  }
  return best;
}

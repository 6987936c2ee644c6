/**
 * Equilibrium flow of a pure fluid through a nozzle, by temperature along its saturation line.
 *
 * One phase expands until its entropy is that of a saturated phase, at T_b. If it is sonic before that, the flow is frozen flow. Otherwise the throat is
 * at the boundary itself, where the velocity lies between the sound speeds on its two sides, or inside the dome, where
 *
 *   h0 − h − M c²/2 = 0,  c the speed of sound of the equilibrium mixture
 *
 * Source   as `equilibrium-nozzle.ts`, which is the slower and more general way to the same answer
 * Holds    isentropes that enter the dome once; anything else is left to the general walk
 * Returns  the flow, or undefined where this way does not apply or its steps fail
 */
import type { FluidModel, PhaseState } from "../eos/fluid-model";
import { EngineError } from "../errors";
import type { Equilibrium } from "../flash/equilibrium";
import { frozenNozzle, type NozzleFlow, type NozzleHints } from "./frozen-nozzle";
import { soundTerm } from "./isentrope-newton";
import { SaturatedIsentrope } from "./saturated-isentrope";

/** Places found before, in parts of the stagnation temperature; zero where there are none. */
export type DomeHints = { entry: number; throat: number; dome: SaturatedIsentrope | undefined };

const settled = 1e-12;
const mostSteps = 40;
const nearestToCritical = 0.9995;
/** Denser streams are liquid or nearly so. */
const leastCompressibility = 0.45;

export function pureEquilibriumNozzle(
  model: FluidModel,
  stagnation: Equilibrium,
  z: ArrayLike<number>,
  component: number,
  backPressurePa: number,
  hints: { frozen: NozzleHints; dome: DomeHints },
): NozzleFlow | undefined {
  try {
    return inDome(model, stagnation, z, model.criticalTemperaturesK[component]!, backPressurePa, hints);
  } catch (error) {
    if (error instanceof EngineError && error.code !== "cancelled") return undefined;
    throw error;
  }
}

function inDome(
  model: FluidModel,
  stagnation: Equilibrium,
  z: ArrayLike<number>,
  Tc: number,
  backPressurePa: number,
  { frozen: frozenHints, dome: hints }: { frozen: NozzleHints; dome: DomeHints },
): NozzleFlow | undefined {
  const { temperatureK: T0, enthalpyJPerMol: h0, entropyJPerMolK: s0 } = stagnation;
  const dome = (hints.dome ??= new SaturatedIsentrope(model, Float64Array.from(z)));
  const alone = stagnation.phases.length === 1 ? stagnation.phases[0]!.state : undefined;
  let entryK = T0;
  let entrySide: "vapour" | "liquid" | undefined;
  if (alone) {
    const dry = staysVapour(model, dome, alone, z, Tc, backPressurePa, frozenHints);
    if (dry) return dry;
    const found = entry(dome, alone, T0, s0, Tc, hints);
    if (!found) return undefined;
    ({ entryK, entrySide } = found);
    const { phase } = dome.side(entrySide);
    const sonicBefore = h0 - phase.enthalpyJPerMol - soundTerm(phase) / 2 >= 0;
    if (sonicBefore || phase.pressurePa <= backPressurePa) return frozenNozzle(model, alone, z, backPressurePa, frozenHints);
  } else if (T0 >= nearestToCritical * Tc) return undefined;
  else dome.moveTo(T0, s0);

  const molarMass = model.mixtureMolarMass(z);
  const excess = (): number => h0 - dome.enthalpyJPerMol - dome.soundTerm / 2;
  const flow = (choked: boolean): NozzleFlow | undefined =>
    dome.quality > -1e-9 && dome.quality < 1 + 1e-9 && dome.soundTerm > 0
      ? {
          massFluxKgPerM2S: Math.sqrt(2 * molarMass * Math.max(h0 - dome.enthalpyJPerMol, 0)) / dome.molarVolumeM3PerMol,
          throatPressurePa: choked ? dome.pressurePa : backPressurePa,
          throatTemperatureK: dome.temperatureK,
          choked,
        }
      : undefined;
  if (alone && excess() >= 0) return flow(true);

  let high = entryK;
  let eHigh = excess();
  let low = 0;
  let T = hints.throat > 0 && hints.throat * T0 < entryK ? hints.throat * T0 : 0.99 * entryK;
  for (let i = 0; i < mostSteps; i++) {
    if (!(T > model.temperatureRangeK[0])) return undefined;
    dome.moveTo(T, s0);
    const e = excess();
    if (!Number.isFinite(e) || !(dome.soundTerm > 0)) return undefined;
    if (e < 0 && dome.pressurePa <= backPressurePa) return atBackPressure(dome, s0, entryK, backPressurePa, flow);
    const slope = (e - eHigh) / (T - high);
    const previousHigh = high;
    if (e < 0) {
      high = T;
      eHigh = e;
    } else low = T;
    let next = T - e / slope;
    if (e >= 0 && Math.abs(e) < 1e-13 * Math.abs(h0)) next = T;
    if (Math.abs(next - T) <= 1e-9 * T) {
      if (dome.pressurePa <= backPressurePa) return atBackPressure(dome, s0, entryK, backPressurePa, flow);
      hints.throat = T / T0;
      return flow(true);
    }
    if (!(slope < 0) || next >= high || next <= low)
      next = low > 0 ? (low + high) / 2 : T - 2 * Math.max(previousHigh - T, 0.005 * T);
    T = next;
  }
  return undefined;
}

/** Frozen flow of a gas whose throat is hotter than the critical point, or has more entropy than saturated vapour there: nothing condenses. */
function staysVapour(
  model: FluidModel,
  dome: SaturatedIsentrope,
  alone: PhaseState,
  z: ArrayLike<number>,
  Tc: number,
  backPressurePa: number,
  hints: NozzleHints,
): NozzleFlow | undefined {
  if (!(alone.compressibility > leastCompressibility)) return undefined;
  const frozen = frozenNozzle(model, alone, z, backPressurePa, hints);
  if (frozen.throatTemperatureK >= Tc) return frozen;
  if (frozen.throatTemperatureK >= nearestToCritical * Tc) return undefined;
  dome.moveTo(frozen.throatTemperatureK, alone.entropyJPerMolK);
  const outside = alone.entropyJPerMolK > dome.vapour.entropyJPerMolK && dome.vapourEntropySlope < 0;
  return outside ? frozen : undefined;
}

/** Where the isentrope meets the dome, with the dome moved there. */
function entry(
  dome: SaturatedIsentrope,
  alone: PhaseState,
  T0: number,
  s0: number,
  Tc: number,
  hints: DomeHints,
): { entryK: number; entrySide: "vapour" | "liquid" } | undefined {
  const top = nearestToCritical * Tc;
  let T = Math.min(hints.entry > 0 ? hints.entry * T0 : 0.98 * T0, 0.99 * Tc, T0);
  let side: "vapour" | "liquid" | undefined;
  for (let i = 0; i < mostSteps; i++) {
    dome.moveTo(T, s0);
    if (side === undefined) {
      const middle = (dome.vapour.entropyJPerMolK + dome.liquid.entropyJPerMolK) / 2;
      side = s0 > middle ? "vapour" : "liquid";
    }
    const { phase, slope } = dome.side(side);
    // A vapour whose saturated entropy rises with temperature leaves the dome as it expands.
    if (side === "vapour" ? !(slope < 0) : !(slope > 0)) return undefined;
    const step = (s0 - phase.entropyJPerMolK) / slope;
    if (Math.abs(step) <= settled * T) {
      if (T > T0 * (1 + 1e-9) || phase.pressurePa > alone.pressurePa * (1 + 1e-7)) return undefined;
      hints.entry = T / T0;
      return { entryK: T, entrySide: side };
    }
    const next = T + Math.max(Math.min(step, 0.1 * T), -0.15 * T);
    if (next >= top) {
      if (T >= 0.998 * Tc) return undefined;
      T = (T + top) / 2;
    } else T = next;
  }
  return undefined;
}

/** The saturation temperature at the back pressure, by Newton on ln p against 1/T. */
function atBackPressure(
  dome: SaturatedIsentrope,
  s0: number,
  entryK: number,
  backPressurePa: number,
  flow: (choked: boolean) => NozzleFlow | undefined,
): NozzleFlow | undefined {
  for (let i = 0; i < mostSteps; i++) {
    const T = dome.temperatureK;
    const gap = Math.log(backPressurePa / dome.pressurePa);
    if (Math.abs(gap) < 1e-13) return flow(false);
    const next = 1 / (1 / T - (gap * dome.pressurePa) / (dome.slopePaPerK * T * T));
    if (!(next > 0)) return undefined;
    dome.moveTo(Math.min(next, entryK), s0);
    if (Math.abs(next / T - 1) < 1e-14) return flow(false);
  }
  return undefined;
}

import { equationIds, type EquationId, type FluidSpec } from "../cases/fluid-spec";
import { EngineError } from "../errors";
import type { Equilibrium } from "../flash/equilibrium";
import { flashPT } from "../flash/flash-pt";
import { gasConstant } from "../gas-constant";
import { createFluidModel } from "./create-fluid-model";
import type { FluidModel } from "./fluid-model";
import { judgeEquation, type FitnessVerdict, type PublishedRange } from "./fitness-rules";
import { referenceFluids } from "./reference/reference-data";
import { equations } from "./registry";
import { byEquation } from "./spread";

export type { FitnessVerdict };

export interface Fitness {
  equation: EquationId;
  title: string;
  verdict: FitnessVerdict;
  /** Sentences for the reader, most important first. */
  notes: string[];
  /** The published range of a multiparameter equation (GERG-2008: the extended one), and whether the state lies in it. */
  published?: PublishedRange;
  /** The PT equilibrium by this equation; absent where it gives none. */
  values?: FitnessValues;
  /** From the best equation for this fluid, where there is one and this is another. */
  deviation?: FitnessDeviation;
}

export interface FitnessValues {
  phase: Equilibrium["phase"];
  vapourMoleFraction: number;
  densityKgPerM3: number;
  compressibility: number;
  /** Real less ideal gas at the same temperature and pressure. */
  enthalpyDepartureJPerMol: number;
  internalEnergyDepartureJPerMol: number;
  /** One phase only. */
  soundSpeedMPerS?: number;
}

export interface FitnessDeviation {
  from: EquationId;
  /** 100 (ρ/ρ_best − 1) */
  densityPercent: number;
  /** Difference of the enthalpy departures, in % of R T and in J/mol. */
  enthalpyPercentOfRT: number;
  enthalpyJPerMol: number;
  /** The two equations find different phases here: the numbers compare unlike states. */
  otherPhase: boolean;
}

interface Point {
  temperatureK: number;
  pressurePa: number;
}

/**
 * What can be said of each equation for a fluid at a state: one entry for every equation, in the order of `equationIds`.
 *
 * Throws   EngineError "invalid-case" where the fluid or the state itself is wrong. An equation that cannot do the fluid is an
 *          entry ("not-applicable"), and so is one that gives no state here ("outside-range").
 */
export function fitness(fluid: FluidSpec, point: Point): Fitness[] {
  requirePoint(point);
  const best = bestEquation(fluid);
  const found = equationIds.map((equation) => {
    const entry = equations[equation]!;
    const base = { equation, title: entry.title };
    let model: FluidModel;
    try {
      model = createFluidModel(byEquation(fluid, equation));
    } catch (error) {
      if (!(error instanceof EngineError) || error.code === "invalid-case") throw error;
      return { ...base, verdict: "not-applicable" as const, notes: [error.message] };
    }
    const { verdict, notes, published } = judgeEquation(model, point, best);
    const values = attempt(() => measured(model, point));
    const own = { ...base, ...(published ? { published } : {}) };
    if (!values) return { ...own, verdict: "outside-range" as const, notes: ["The equation gives no state here.", ...notes] };
    return { ...own, verdict, notes, values };
  });
  const reference: Fitness | undefined = found.find(({ equation }) => equation === best);
  return found.map((entry: Fitness) => withDeviation(entry, reference, point.temperatureK));
}

function withDeviation(entry: Fitness, best: Fitness | undefined, T: number): Fitness {
  if (!best?.values || !entry.values || entry.equation === best.equation) return entry;
  const difference = entry.values.enthalpyDepartureJPerMol - best.values.enthalpyDepartureJPerMol;
  const deviation: FitnessDeviation = {
    from: best.equation,
    densityPercent: 100 * (entry.values.densityKgPerM3 / best.values.densityKgPerM3 - 1),
    enthalpyPercentOfRT: (100 * difference) / (gasConstant * T),
    enthalpyJPerMol: difference,
    otherPhase: unlike(entry.values, best.values),
  };
  return { ...entry, deviation };
}

/** Vapour here and liquid there, or a split here and none there; supercritical is a word for either. */
function unlike(a: FitnessValues, b: FitnessValues): boolean {
  if (a.phase === "two-phase" || b.phase === "two-phase") return a.phase !== b.phase;
  return Math.max(a.densityKgPerM3 / b.densityKgPerM3, b.densityKgPerM3 / a.densityKgPerM3) > 2;
}

/** The most accurate equation held for a fluid: the reference equation of a pure one, GERG-2008 for a mixture that it covers. */
export function bestEquation(fluid: FluidSpec): EquationId | undefined {
  const present = fluid.components.filter(({ moleFraction }) => moleFraction > 0);
  if (
    fluid.components.length === 1 &&
    present[0] &&
    !present[0].custom &&
    !present[0].pseudo &&
    referenceFluids.has(present[0].id)
  )
    return "reference";
  return attempt(() => createFluidModel(byEquation(fluid, "gerg-2008"))) ? "gerg-2008" : undefined;
}

function requirePoint({ temperatureK, pressurePa }: Point): void {
  for (const [field, value] of [
    ["temperatureK", temperatureK],
    ["pressurePa", pressurePa],
  ] as const) {
    if (!(value > 0 && Number.isFinite(value))) throw new EngineError("invalid-case", `${field} must be above 0`, {}, field);
  }
}

function measured(model: FluidModel, point: Point): FitnessValues {
  const state = flashPT(model, point);
  const { temperatureK: T, pressurePa: p, molarVolumeM3PerMol: v, phase, vapourMoleFraction, phases } = state;
  const ideal = model.idealGas(T, p, model.feed);
  const values: FitnessValues = {
    phase,
    vapourMoleFraction,
    densityKgPerM3: model.mixtureMolarMass(model.feed) / v,
    compressibility: (p * v) / (model.gasConstantJPerMolK * T),
    enthalpyDepartureJPerMol: state.enthalpyJPerMol - ideal.enthalpyJPerMol,
    internalEnergyDepartureJPerMol: state.internalEnergyJPerMol - ideal.internalEnergyJPerMol,
  };
  return phases.length === 1 ? { ...values, soundSpeedMPerS: phases[0]!.state.soundSpeedMPerS } : values;
}

function attempt<Value>(work: () => Value): Value | undefined {
  try {
    return work();
  } catch (error) {
    if (error instanceof EngineError) return undefined;
    throw error;
  }
}

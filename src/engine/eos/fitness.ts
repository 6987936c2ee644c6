import { equationIds, type EquationId, type FluidSpec } from "../cases/fluid-spec";
import { EngineError } from "../errors";
import { flashPT } from "../flash/flash-pt";
import { createFluidModel } from "./create-fluid-model";
import type { FluidModel } from "./fluid-model";
import { gergValidity } from "./gerg/gerg-data";
import { referenceFluids } from "./reference/reference-data";
import { equations } from "./registry";

/** "first": the most accurate there is for this fluid; "fit": acceptable for screening; the rest say why not. */
export type FitnessVerdict = "first" | "fit" | "uncertain" | "comparison-only" | "outside-range" | "not-applicable";

export interface Fitness {
  equation: EquationId;
  title: string;
  verdict: FitnessVerdict;
  /** Sentences for the reader, most important first. */
  notes: string[];
  /** Deviation of density [%] and of the enthalpy departure [% of R T] from the best equation for this fluid, where there is one. */
  deviation?: { from: EquationId; densityPercent: number; enthalpyPercentOfRT: number };
}

interface Point {
  temperatureK: number;
  pressurePa: number;
}

/** Shares and distances of the notes (policy, ours; docs/methods/fitness.md). */
const policy = { nearTemperature: 0.05, nearPressure: 0.1, quantumShare: 0.05, polarShare: 0.001, alphaLimit: 5 };
const quantum = new Set(["hydrogen", "helium"]);
const polar = new Set(["water", "methanol", "ammonia"]);

/** What can be said of each equation for a fluid at a state, in the order of the registry. */
export function fitness(fluid: FluidSpec, point: Point): Fitness[] {
  const best = bestEquation(fluid);
  const bench = best ? attempt(() => measured(withEquation(fluid, best), point)) : undefined;
  return equationIds.flatMap((equation): Fitness[] => {
    const entry = equations[equation];
    if (!entry) return [];
    const base = { equation, title: entry.title };
    let model: FluidModel;
    try {
      model = createFluidModel(withEquation(fluid, equation));
    } catch (error) {
      if (!(error instanceof EngineError) || error.code === "invalid-case") throw error;
      return [{ ...base, verdict: "not-applicable", notes: [error.message] }];
    }
    const { verdict, notes } = judge(model, point, best);
    const own = equation === best ? bench : attempt(() => measured(withEquation(fluid, equation), point));
    if (!own) return [{ ...base, verdict: "outside-range", notes: ["The equation gives no state here.", ...notes] }];
    const deviation =
      best && bench && equation !== best
        ? {
            from: best,
            densityPercent: 100 * (bench.volume / own.volume - 1),
            enthalpyPercentOfRT: (100 * (own.departure - bench.departure)) / (8.314 * point.temperatureK),
          }
        : undefined;
    return [deviation ? { ...base, verdict, notes, deviation } : { ...base, verdict, notes }];
  });
}

/** The reference equation of a pure fluid, GERG-2008 for a mixture of its components, else none. */
function bestEquation(fluid: FluidSpec): EquationId | undefined {
  const present = fluid.components.filter(({ moleFraction }) => moleFraction > 0);
  if (fluid.components.length === 1 && present[0] && !present[0].custom && referenceFluids.has(present[0].id)) return "reference";
  return attempt(() => createFluidModel(withEquation(fluid, "gerg-2008"))) ? "gerg-2008" : undefined;
}

function withEquation(fluid: FluidSpec, equation: EquationId): FluidSpec {
  const list = Array.isArray(fluid.interaction) && equation !== fluid.equation;
  return { ...fluid, equation, interaction: list ? "library" : fluid.interaction };
}

function measured(fluid: FluidSpec, point: Point) {
  const model = createFluidModel(fluid);
  const state = flashPT(model, point);
  const ideal = model.idealGas(point.temperatureK, point.pressurePa, model.feed);
  return { volume: state.molarVolumeM3PerMol, departure: state.enthalpyJPerMol - ideal.enthalpyJPerMol };
}

function judge(model: FluidModel, { temperatureK: T, pressurePa: p }: Point, best: EquationId | undefined) {
  const { equation, substances, feed } = model;
  const notes: string[] = [];
  let verdict: FitnessVerdict = equation === best ? "first" : "fit";
  const lower = (to: FitnessVerdict, note: string) => {
    const order: FitnessVerdict[] = ["first", "fit", "uncertain", "comparison-only", "outside-range", "not-applicable"];
    if (order.indexOf(to) > order.indexOf(verdict)) verdict = to;
    notes.push(note);
  };
  const isCubic = equation !== "reference" && equation !== "gerg-2008";
  const rich = (set: ReadonlySet<string>, share: number) => substances.some(({ id }, i) => set.has(id) && feed[i]! > share);

  if (equation === "van-der-waals" || equation === "redlich-kwong")
    lower("comparison-only", "Kept for comparison; not a basis for signing.");
  if (equation === "reference") {
    const { validity, citation } = referenceFluids.get(substances[0]!.id)!;
    if (T < validity.Tmin_K || T > validity.Tmax_K || p > validity.pmax_Pa) {
      lower("outside-range", `Published for ${validity.Tmin_K} to ${validity.Tmax_K} K and up to ${validity.pmax_Pa / 1e5} bar.`);
    }
    notes.push(citation);
  }
  if (equation === "gerg-2008") {
    const inside = ({ T_K, p_Pa }: (typeof gergValidity)["normal"]) => T >= T_K[0] && T <= T_K[1] && p <= p_Pa[1];
    if (!inside(gergValidity.extended))
      lower("outside-range", "Outside the extended range of GERG-2008 (60 to 700 K, up to 700 bar).");
    else if (!inside(gergValidity.normal))
      lower("uncertain", "Outside the normal range of GERG-2008 (90 to 450 K, up to 350 bar), inside the extended one.");
    else notes.push("Normal range: 0.1 % in density and speed of sound for typical natural gas from 250 to 450 K (from memory).");
  }
  if (isCubic && rich(polar, policy.polarShare)) {
    lower("uncertain", "Water, methanol or ammonia is present: the classical mixing rules predict their liquids badly.");
  }
  if (isCubic && rich(quantum, policy.quantumShare)) {
    lower("uncertain", "Hydrogen or helium is present: the enthalpy departure may have the wrong sign near inversion.");
  }
  if (
    isCubic &&
    substances.some(
      ({ criticalTemperatureK }, i) => feed[i]! > policy.quantumShare && T > policy.alphaLimit * criticalTemperatureK,
    )
  ) {
    notes.push("A component is above five times its critical temperature, where the temperature function was not fitted.");
  }
  if (isCubic && nearCritical(model, T, p)) {
    lower(
      "uncertain",
      "Within 5 % of the critical temperature and 10 % of the critical pressure: energies uncertain, not for acceptance.",
    );
  }
  if (isCubic && notes.length === 0) {
    notes.push("Gas densities within about 3 %, saturation pressures within about 5 %, liquid densities within 5 to 15 %.");
  }
  return { verdict, notes };
}

/** Li's critical temperature and the mole-weighted critical pressure, as in flash/classify-phase.ts. */
function nearCritical({ criticalTemperaturesK: Tc, criticalPressuresPa: pc, feed }: FluidModel, T: number, p: number): boolean {
  let volume = 0;
  let weighted = 0;
  let pressure = 0;
  for (let i = 0; i < feed.length; i++) {
    const own = feed[i]! * (Tc[i]! / pc[i]!);
    volume += own;
    weighted += own * Tc[i]!;
    pressure += feed[i]! * pc[i]!;
  }
  return Math.abs(T / (weighted / volume) - 1) < policy.nearTemperature && Math.abs(p / pressure - 1) < policy.nearPressure;
}

function attempt<Value>(work: () => Value): Value | undefined {
  try {
    return work();
  } catch (error) {
    if (error instanceof EngineError) return undefined;
    throw error;
  }
}

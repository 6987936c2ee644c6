import type { EquationId } from "../cases/fluid-spec";
import type { FluidModel } from "./fluid-model";
import { gergValidity } from "./gerg/gerg-data";
import { referenceFluids } from "./reference/reference-data";

/** "first": the most accurate there is for this fluid; "fit": acceptable for screening; the rest say why not. */
export type FitnessVerdict = "first" | "fit" | "uncertain" | "comparison-only" | "outside-range" | "not-applicable";

/** Worst last. */
const order: readonly FitnessVerdict[] = ["first", "fit", "uncertain", "comparison-only", "outside-range", "not-applicable"];

export interface PublishedRange {
  temperatureK: readonly [number, number];
  maximumPressurePa: number;
  inside: boolean;
}

/** Shares and distances of the notes (policy, ours; docs/methods/fitness.md). */
const policy = { nearTemperature: 0.05, nearPressure: 0.1, quantumShare: 0.05, polarShare: 0.001, acidShare: 0.2, alphaLimit: 5 };
const quantum = new Set(["hydrogen", "helium", "neon"]);
const polar = new Set(["water", "methanol", "ethanol", "ammonia", "ethylene_glycol", "diethylene_glycol", "triethylene_glycol"]);
const acid = new Set(["hydrogen_sulfide", "sulfur_dioxide"]);

interface Judgement {
  verdict: FitnessVerdict;
  notes: string[];
  published?: PublishedRange;
}

/** The verdict on one equation for a fluid at a state, from what is known of the equation, without computing the state. */
export function judgeEquation(
  model: FluidModel,
  point: { temperatureK: number; pressurePa: number },
  best: EquationId | undefined,
): Judgement {
  const { equation } = model;
  const found: Judgement = { verdict: equation === best ? "first" : "fit", notes: [] };
  if (equation === "reference") judgeReference(model, point, found);
  else if (equation === "gerg-2008") judgeGerg(model, point, found);
  else judgeCubic(model, point, found);
  const solid = model.substances.filter(
    (substance, i) => model.feed[i]! > 0.5 && substance.triplePointK !== undefined && point.temperatureK < substance.triplePointK,
  );
  for (const { id, triplePointK } of solid) {
    lower(
      found,
      "outside-range",
      `${id} is solid below its triple point at ${triplePointK!.toFixed(1)} K; no equation here describes a solid.`,
    );
  }
  return found;
}

function lower(found: Judgement, to: FitnessVerdict, note: string): void {
  if (order.indexOf(to) > order.indexOf(found.verdict)) found.verdict = to;
  found.notes.push(note);
}

type Point = { temperatureK: number; pressurePa: number };

function judgeReference({ substances }: FluidModel, { temperatureK: T, pressurePa: p }: Point, found: Judgement): void {
  const { validity, citation } = referenceFluids.get(substances[0]!.id)!;
  const { Tmin_K: coldest, Tmax_K: hottest, pmax_Pa: highest } = validity;
  const inside = T >= coldest && T <= hottest && p <= highest;
  found.published = { temperatureK: [coldest, hottest], maximumPressurePa: highest, inside };
  if (!inside) lower(found, "outside-range", `Published for ${coldest} to ${hottest} K and up to ${highest / 1e5} bar.`);
  found.notes.push(citation);
}

function judgeGerg(model: FluidModel, { temperatureK: T, pressurePa: p }: Point, found: Judgement): void {
  const within = ({ T_K, p_Pa }: (typeof gergValidity)["normal"]) => T >= T_K[0] && T <= T_K[1] && p <= p_Pa[1];
  const { extended, normal } = gergValidity;
  found.published = { temperatureK: extended.T_K, maximumPressurePa: extended.p_Pa[1], inside: within(extended) };
  if (!within(extended)) lower(found, "outside-range", "Outside the extended range of GERG-2008 (60 to 700 K, up to 700 bar).");
  else if (!within(normal))
    lower(found, "uncertain", "Outside the normal range of GERG-2008 (90 to 450 K, up to 350 bar), inside the extended one.");
  else
    found.notes.push(
      "Normal range: 0.1 % in density and speed of sound for typical natural gas from 250 to 450 K (from memory).",
    );
  if (share(model, polar) > policy.polarShare) {
    lower(
      found,
      "uncertain",
      "Water is present: GERG-2008 was fitted to water as a trace in gas, not to liquid water and what it dissolves.",
    );
  }
  if (share(model, acid) > policy.acidShare) {
    lower(found, "uncertain", "More than 20 % hydrogen sulfide: few measurements stand behind its mixtures in GERG-2008.");
  }
  if (present(model) > 1 && nearCritical(model, T, p)) {
    lower(
      found,
      "uncertain",
      "Near the critical point of the mixture: phase boundaries and energies are less certain than elsewhere.",
    );
  }
}

function judgeCubic(model: FluidModel, { temperatureK: T, pressurePa: p }: Point, found: Judgement): void {
  const { equation, substances, feed } = model;
  if (equation === "van-der-waals" || equation === "redlich-kwong")
    lower(found, "comparison-only", "Kept for comparison; not a basis for signing.");
  if (share(model, polar) > policy.polarShare) {
    lower(
      found,
      "uncertain",
      "Water, an alcohol, a glycol or ammonia is present: the classical mixing rules predict their liquids badly.",
    );
  }
  if (share(model, quantum) > policy.quantumShare) {
    lower(
      found,
      "uncertain",
      "Hydrogen, helium or neon is present: the enthalpy departure may have the wrong sign near inversion.",
    );
  }
  if (
    substances.some(
      ({ criticalTemperatureK }, i) => feed[i]! > policy.quantumShare && T > policy.alphaLimit * criticalTemperatureK,
    )
  ) {
    found.notes.push("A component is above five times its critical temperature, where the temperature function was not fitted.");
  }
  if (nearCritical(model, T, p)) {
    lower(
      found,
      "uncertain",
      "Within 5 % of the critical temperature and 10 % of the critical pressure: energies uncertain, not for acceptance.",
    );
  }
  if (found.notes.length === 0) {
    found.notes.push("Gas densities within about 3 %, saturation pressures within about 5 %, liquid densities within 5 to 15 %.");
  }
}

/** Mole fraction of the components in a set, together. */
function share({ componentIds, feed }: FluidModel, set: ReadonlySet<string>): number {
  return componentIds.reduce((sum, id, i) => (set.has(id) ? sum + feed[i]! : sum), 0);
}

const present = ({ feed }: FluidModel): number => feed.reduce((count, fraction) => (fraction > 0 ? count + 1 : count), 0);

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

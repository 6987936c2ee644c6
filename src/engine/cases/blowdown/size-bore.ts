/**
 * The bore that brings the vessel to a target pressure in a target time.
 *
 * The time falls as the area grows, nearly as its inverse: secant on ln t against ln A with first slope −1, inside a bracket. An adiabatic vessel
 * obeys t A = constant and needs two runs; wall heat and fire bend the line. First runs are loose; the last are at the case's own tolerance.
 * Returns  the case with an orifice of that bore, and the bore
 * Throws   EngineError "no-convergence" where no bore up to the limits reaches the target in that time; what a run itself throws
 */
import { EngineError } from "../../errors";
import type { BlowdownCase, OrificeRelease, SizedRelease } from "../blowdown-case";
import { integrateRun, type RunOptions } from "./integrate-run";
import { makeBalance } from "./make-balance";
import { makeVesselModel } from "./vessel-model";

export type SizedCase = { document: BlowdownCase; diameterM: number; timeS: number; runs: number; evaluations: number };

const closeEnough = 1e-4;
const looseTolerance = 1e-4;
/** Nearer than this in time the loose runs' own error counts. */
const looseIsGoodEnough = 3e-3;
const mostRuns = 40;
/** A run that takes this many times the target time counts as "never". */
const never = 30;

type SizeOptions = Omit<RunOptions, "relativeTolerance" | "onProgress"> & { firstDiameterM?: number };

export function sizeBore(blowdown: BlowdownCase, release: SizedRelease, options: SizeOptions): SizedCase {
  const { targetPressurePa, targetTimeS } = release;
  const withBore = (diameterM: number): BlowdownCase => ({ ...blowdown, release: orificeOf(release, diameterM) });
  const tight = Math.min(blowdown.run.relativeTolerance, 1e-5);
  let lnA = Math.log(options.firstDiameterM ? areaOf(options.firstDiameterM) : firstArea(withBore(1), release));
  let low = Number.NEGATIVE_INFINITY;
  let high = Number.POSITIVE_INFINITY;
  let before: { lnA: number; lnT: number } | undefined;
  let tolerance = looseTolerance;
  let evaluations = 0;
  for (let runs = 1; runs <= mostRuns; runs++) {
    const diameterM = Math.sqrt((4 * Math.exp(lnA)) / Math.PI);
    const { timeS, evaluations: used } = timeToTarget(withBore(diameterM), release, { ...options, relativeTolerance: tolerance });
    evaluations += used;
    const lnT = timeS === undefined ? Number.POSITIVE_INFINITY : Math.log(timeS / targetTimeS);
    if (timeS !== undefined && Math.abs(lnT) < closeEnough && tolerance <= tight)
      return { document: withBore(diameterM), diameterM, timeS, runs, evaluations };
    if (Math.abs(lnT) < looseIsGoodEnough && tolerance > tight) {
      // A bracket from loose runs may be off by their error.
      [low, high, tolerance] = [low - 2 * looseIsGoodEnough, high + 2 * looseIsGoodEnough, tight];
      if (Math.abs(lnT) < closeEnough) {
        before = undefined;
        continue;
      }
    }
    if (lnT > 0) low = Math.max(low, lnA);
    else high = Math.min(high, lnA);
    const slope = before && Number.isFinite(lnT) && before.lnA !== lnA ? (lnT - before.lnT) / (lnA - before.lnA) : -1;
    let next = Number.isFinite(lnT) && slope < -0.05 ? lnA - lnT / slope : lnA + 1.5;
    if (next <= low || next >= high)
      next = high === Number.POSITIVE_INFINITY ? low + 1.5 : low === Number.NEGATIVE_INFINITY ? high - 1.5 : (low + high) / 2;
    before = Number.isFinite(lnT) ? { lnA, lnT } : undefined;
    if (high - low < 1e-9 || lnA > Math.log(100)) break;
    lnA = next;
  }
  throw new EngineError(
    "no-convergence",
    `No bore brings the vessel to ${Math.round(targetPressurePa)} Pa in ${targetTimeS} s. Allow more time or a higher target pressure.`,
    {},
    "release.targetTimeS",
  );
}

const areaOf = (diameterM: number): number => (Math.PI / 4) * diameterM ** 2;

const orificeOf = ({ targetPressurePa: _p, targetTimeS: _t, ...rest }: SizedRelease, diameterM: number): OrificeRelease => ({
  ...rest,
  path: "orifice",
  diameterM,
});

/** Area [m²] that would empty the vessel exponentially to the target at its first rate. */
function firstArea(oneMetre: BlowdownCase, { targetPressurePa, targetTimeS }: SizedRelease): number {
  const balance = makeBalance(makeVesselModel(oneMetre));
  const { start } = balance.model;
  if (!(targetPressurePa < start.pressurePa)) {
    throw new EngineError(
      "invalid-case",
      `The target must lie below the pressure at start, ${Math.round(start.pressurePa)} Pa.`,
      {},
      "release.targetPressurePa",
    );
  }
  const { rateKgPerS } = balance.at(0, balance.startState(), start.twoPhase ? "two-phase" : "one-phase").flow;
  return (Math.PI / 4) * ((balance.massScaleKg * Math.log(start.pressurePa / targetPressurePa)) / (targetTimeS * rateKgPerS));
}

function timeToTarget(
  blowdown: BlowdownCase,
  { targetPressurePa, targetTimeS }: SizedRelease,
  { firstDiameterM: _first, ...options }: SizeOptions & { relativeTolerance: number },
): { timeS: number | undefined; evaluations: number } {
  const toTarget = { ...blowdown, run: { ...blowdown.run, stopPressurePa: targetPressurePa, stopTimeS: never * targetTimeS } };
  const run = integrateRun(makeBalance(makeVesselModel(toTarget)), toTarget, options);
  if (run.endedBy === "pressure") return { timeS: run.endTimeS, evaluations: run.evaluations };
  if (run.endedBy !== "solid-phase") return { timeS: undefined, evaluations: run.evaluations };
  throw new EngineError(
    "solid-phase",
    `Solid forms at ${run.endTimeS.toPrecision(3)} s, before the target pressure is reached. Choose a higher target.`,
    {},
    "release.targetPressurePa",
  );
}

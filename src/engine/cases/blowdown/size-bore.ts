/**
 * The bore that brings the vessel to a target pressure in a target time.
 *
 * The time falls as the area grows, nearly as its inverse: secant on ln t against ln A with first slope −1, inside a bracket. An adiabatic vessel
 * obeys t A = constant and needs two runs; wall heat and fire bend the line. First runs are loose; the last are at the case's own tolerance.
 * A fire can heat a vessel so that a little smaller bore never reaches the target: the time then jumps, and the smallest bore beyond the jump is
 * the answer, with a time below the target.
 * Returns  the case with an orifice of that bore, and the bore
 * Throws   EngineError "no-convergence" where no bore up to the limits reaches the target in that time; what a run itself throws
 */
import { EngineError } from "../../errors";
import type { BlowdownCase, OrificeRelease, SizedRelease } from "../blowdown-case";
import { integrateRun, type RunOptions } from "./integrate-run";
import { makeBalance } from "./make-balance";
import { makeVesselModel } from "./vessel-model";

export type SizedCase = { document: BlowdownCase; diameterM: number; timeS: number; runs: number; evaluations: number };

/** A run that takes this many times the target time counts as "never". */
const never = 8;
const mostRuns = 40;
const largestLnArea = Math.log(100);

/** How near in time, how near in area where the time jumps, and how far to step where one side is unknown. */
type Search = { tolerance: number; closeEnough: number; jumpWidth: number; stride: number };
const loose: Search = { tolerance: 1e-4, closeEnough: 3e-3, jumpWidth: 1e-3, stride: 1.5 };
const tight: Search = { tolerance: 1e-5, closeEnough: 1e-4, jumpWidth: 1e-4, stride: 0.01 };

type SizeOptions = Omit<RunOptions, "relativeTolerance" | "onProgress">;

export function sizeBore(blowdown: BlowdownCase, release: SizedRelease, options: SizeOptions): SizedCase {
  const { targetPressurePa, targetTimeS } = release;
  const withBore = (diameterM: number): BlowdownCase => ({ ...blowdown, release: orificeOf(release, diameterM) });
  const counted = { runs: 0, evaluations: 0 };
  const timeWith =
    (relativeTolerance: number) =>
    (lnA: number): number | undefined => {
      const found = timeToTarget(withBore(diameterOf(lnA)), release, { ...options, relativeTolerance });
      counted.runs++;
      counted.evaluations += found.evaluations;
      return found.timeS;
    };
  const own = { ...tight, tolerance: Math.min(blowdown.run.relativeTolerance, tight.tolerance) };
  const near = search(timeWith(loose.tolerance), targetTimeS, Math.log(firstArea(withBore(1), release)), loose);
  const found = near && search(timeWith(own.tolerance), targetTimeS, near.lnA, own);
  if (found) {
    const diameterM = diameterOf(found.lnA);
    return { document: withBore(diameterM), diameterM, timeS: found.timeS, ...counted };
  }
  throw new EngineError(
    "no-convergence",
    `No bore brings the vessel to ${Math.round(targetPressurePa)} Pa in ${targetTimeS} s. Allow more time or a higher target pressure.`,
    {},
    "release.targetTimeS",
  );
}

type Found = { lnA: number; timeS: number };

function search(
  timeAt: (lnA: number) => number | undefined,
  targetTimeS: number,
  from: number,
  { closeEnough, jumpWidth, stride }: Search,
): Found | undefined {
  let [lnA, low, high] = [from, Number.NEGATIVE_INFINITY, Number.POSITIVE_INFINITY];
  let fast: Found | undefined;
  let before: { lnA: number; lnT: number } | undefined;
  for (let runs = 0; runs < mostRuns && lnA < largestLnArea; runs++) {
    const timeS = timeAt(lnA);
    const lnT = timeS === undefined ? Number.POSITIVE_INFINITY : Math.log(timeS / targetTimeS);
    if (timeS !== undefined && Math.abs(lnT) < closeEnough) return { lnA, timeS };
    if (timeS !== undefined && lnT < 0) [high, fast] = [lnA, { lnA, timeS }];
    else low = lnA;
    if (fast && high - low < jumpWidth) return fast;
    const slope = before && Number.isFinite(lnT) ? (lnT - before.lnT) / (lnA - before.lnA) : -1;
    before = Number.isFinite(lnT) ? { lnA, lnT } : undefined;
    const secant = before && slope < -0.05 ? lnA - lnT / slope : Number.NaN;
    // A jump draws the secant to one side for ever; every third run halves the bracket.
    if (secant > low && secant < high && runs % 3 !== 2) lnA = secant;
    else if (high === Number.POSITIVE_INFINITY) lnA = low + stride;
    else if (low === Number.NEGATIVE_INFINITY) lnA = high - stride;
    else lnA = (low + high) / 2;
  }
  return undefined;
}

const diameterOf = (lnA: number): number => Math.sqrt((4 * Math.exp(lnA)) / Math.PI);

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
  options: SizeOptions & { relativeTolerance: number },
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

/**
 * The bore that brings the vessel to a target pressure in a target time.
 *
 * The time falls as the area grows, nearly as its inverse: secant on ln t against ln A with first slope −1, inside a bracket. An adiabatic vessel
 * obeys t A = constant and needs two runs; wall heat and fire bend the line.
 * Returns  the case with an orifice of that bore, and the bore
 * Throws   EngineError "no-convergence" where no bore up to the limits reaches the target in that time; what a run itself throws
 */
import { EngineError } from "../../errors";
import type { BlowdownCase, OrificeRelease, SizedRelease } from "../blowdown-case";
import { Balance } from "./balance";
import { integrateRun, type RunOptions } from "./integrate-run";
import { makeVesselModel } from "./vessel-model";

export type SizedCase = { document: BlowdownCase; diameterM: number; runs: number };

const closeEnough = 1e-4;
const mostRuns = 40;
/** A run that takes this many times the target time counts as "never". */
const never = 30;

export function sizeBore(
  blowdown: BlowdownCase,
  release: SizedRelease,
  options: Omit<RunOptions, "relativeTolerance" | "onProgress">,
): SizedCase {
  const { targetPressurePa, targetTimeS } = release;
  const withBore = (diameterM: number): BlowdownCase => ({ ...blowdown, release: orificeOf(release, diameterM) });
  let lnA = Math.log(firstArea(withBore(1), release));
  let low = Number.NEGATIVE_INFINITY;
  let high = Number.POSITIVE_INFINITY;
  let before: { lnA: number; lnT: number } | undefined;
  for (let runs = 1; runs <= mostRuns; runs++) {
    const diameterM = Math.sqrt((4 * Math.exp(lnA)) / Math.PI);
    const timeS = timeToTarget(withBore(diameterM), release, options);
    const lnT = timeS === undefined ? Number.POSITIVE_INFINITY : Math.log(timeS / targetTimeS);
    if (Math.abs(lnT) < closeEnough) return { document: withBore(diameterM), diameterM, runs };
    if (lnT > 0) low = lnA;
    else high = lnA;
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

const orificeOf = ({ targetPressurePa: _p, targetTimeS: _t, ...rest }: SizedRelease, diameterM: number): OrificeRelease => ({
  ...rest,
  path: "orifice",
  diameterM,
});

/** Area [m²] that would empty the vessel exponentially to the target at its first rate. */
function firstArea(oneMetre: BlowdownCase, { targetPressurePa, targetTimeS }: SizedRelease): number {
  const balance = new Balance(makeVesselModel(oneMetre));
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
  const area =
    (Math.PI / 4) * ((balance.massScaleKg * Math.log(start.pressurePa / targetPressurePa)) / (targetTimeS * rateKgPerS));
  return area;
}

function timeToTarget(
  blowdown: BlowdownCase,
  { targetPressurePa, targetTimeS }: SizedRelease,
  options: Omit<RunOptions, "relativeTolerance" | "onProgress">,
): number | undefined {
  const toTarget = { ...blowdown, run: { ...blowdown.run, stopPressurePa: targetPressurePa, stopTimeS: never * targetTimeS } };
  const run = integrateRun(new Balance(makeVesselModel(toTarget)), toTarget, { ...options, relativeTolerance: 1e-5 });
  if (run.endedBy === "pressure") return run.endTimeS;
  if (run.endedBy !== "solid-phase") return undefined;
  throw new EngineError(
    "solid-phase",
    `Solid forms at ${run.endTimeS.toPrecision(3)} s, before the target pressure is reached. Choose a higher target.`,
    {},
    "release.targetPressurePa",
  );
}

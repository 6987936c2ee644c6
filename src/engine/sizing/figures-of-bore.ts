/**
 * The figures of one run that a bore is judged by, without its series: time to a pressure, coldest steel, peak load.
 *
 * Extremes are read at the ends and in the middle of each step, which is enough for steel (slow) and for a load that falls from the start.
 */
import { integrateRun } from "../cases/blowdown/integrate-run";
import { makeBalance } from "../cases/blowdown/make-balance";
import { makeVesselModel } from "../cases/blowdown/vessel-model";
import type { BlowdownCase, OrificeRelease } from "../cases/blowdown-case";
import type { EndedBy } from "../cases/blowdown-result";
import { EngineError } from "../errors";

export type BoreFigures = {
  endTimeS: number;
  endedBy: EndedBy;
  minimumWallTemperatureK: number | undefined;
  peakVentRateKgPerS: number;
};

export type BoreOptions = {
  relativeTolerance: number;
  isCancelled?: (() => boolean) | undefined;
  counted: { runs: number; evaluations: number };
};

const maxEvaluations = 100_000;

export function withBore(blowdown: BlowdownCase, diameterM: number): BlowdownCase {
  return { ...blowdown, release: orificeOf(blowdown.release, diameterM) };
}

/** Throws EngineError "not-applicable" for a valve, which has no bore. */
export function orificeOf(release: BlowdownCase["release"], diameterM: number): OrificeRelease {
  switch (release.path) {
    case "orifice":
      return { ...release, diameterM };
    case "sized": {
      const { targetPressurePa: _p, targetTimeS: _t, ...rest } = release;
      return { ...rest, path: "orifice", diameterM };
    }
    default:
      throw new EngineError(
        "not-applicable",
        'Only the bore of an orifice is searched for. Use the path "orifice".',
        {},
        "release.path",
      );
  }
}

export function figuresOfBore(blowdown: BlowdownCase, { relativeTolerance, isCancelled, counted }: BoreOptions): BoreFigures {
  const balance = makeBalance(makeVesselModel(blowdown));
  const run = integrateRun(balance, blowdown, { relativeTolerance, maxEvaluations, ...(isCancelled ? { isCancelled } : {}) });
  counted.runs++;
  counted.evaluations += run.evaluations;
  let coldest = Number.POSITIVE_INFINITY;
  let peak = 0;
  for (const segment of run.segments) {
    for (const step of segment.dense.steps) {
      for (const t of [step.t0, (step.t0 + step.t1) / 2, step.t1]) {
        const { instant } = balance.within(segment, step, t);
        const { innerSurfaceK, liquidSurfaceK } = instant.heat;
        coldest = Math.min(coldest, innerSurfaceK ?? Number.POSITIVE_INFINITY, liquidSurfaceK ?? Number.POSITIVE_INFINITY);
        peak = Math.max(peak, instant.ventRateKgPerS);
      }
    }
  }
  return {
    endTimeS: run.endTimeS,
    endedBy: run.endedBy,
    minimumWallTemperatureK: Number.isFinite(coldest) ? coldest : undefined,
    peakVentRateKgPerS: peak,
  };
}

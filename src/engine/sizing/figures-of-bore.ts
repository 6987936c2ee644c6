/**
 * The figures of one run that a bore is judged by, without its series: time to a pressure, coldest steel, peak load.
 *
 * Steel is read at the ends and in the middle of each step, and so is the load where that costs no more; a load peaks at the start or slowly.
 */
import { DenseRun } from "../cases/blowdown/dense-run";
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
  // A lumped wall is read off its heat content; a surface of its own needs the film, and so the state of the fluid.
  const { wall, zones } = balance.model;
  const lump = wall && !zones && blowdown.heat.wall.model === "lumped" ? wall : undefined;
  let coldest = Number.POSITIVE_INFINITY;
  let peak = 0;
  run.segments.forEach((segment, s) =>
    segment.dense.steps.forEach((step, i) => {
      const moments = [step.t0, (step.t0 + step.t1) / 2, step.t1];
      if (lump)
        for (const t of moments) coldest = Math.min(coldest, lump.temperatureAtK(balance.wallEnergyJ(DenseRun.inside(step, t))));
      for (const t of lump ? moments.slice(s + i === 0 ? 0 : 2) : moments) {
        const { heat, ventRateKgPerS } = balance.within(segment, step, t).instant;
        peak = Math.max(peak, ventRateKgPerS);
        if (!lump) coldest = Math.min(coldest, heat.innerSurfaceK ?? Infinity, heat.liquidSurfaceK ?? Infinity);
      }
    }),
  );
  return {
    endTimeS: run.endTimeS,
    endedBy: run.endedBy,
    minimumWallTemperatureK: Number.isFinite(coldest) ? coldest : undefined,
    peakVentRateKgPerS: peak,
  };
}

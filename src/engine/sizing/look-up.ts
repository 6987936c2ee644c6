/** Both figures of a bore, loosely for a row and at the case's tolerance for an edge. */
import type { BlowdownCase } from "../cases/blowdown-case";
import type { SizingCase, SizingPoint } from "../cases/sizing-case";
import type { Warning } from "../cases/warning";
import { EngineError } from "../errors";
import { figuresOfBore, withBore, type BoreOptions } from "./figures-of-bore";
import type { SizingLimits } from "./sizing-limits";

export type LookUp = {
  loose: (diameterM: number) => SizingPoint;
  tight: (diameterM: number) => SizingPoint;
  looseSteelK: (diameterM: number) => number;
  tightSteelK: (diameterM: number) => number;
  tightTimeS: (diameterM: number) => number | undefined;
  counted: BoreOptions["counted"];
  /** Runs of a row that could not be computed. */
  failed: Warning[];
  isCancelled: (() => boolean) | undefined;
};

const looseTolerance = 1e-4;
/** Slower than this many times the target is off the chart. */
const slowest = 3;

export function makeLookUp(
  { fire, cold }: SizingCase,
  limits: SizingLimits,
  { isCancelled, counted }: Pick<LookUp, "isCancelled" | "counted">,
): LookUp {
  const look = (blowdown: BlowdownCase, name: "fire" | "cold", diameterM: number, loose: boolean) =>
    underPath(name, () =>
      figuresOfBore(withBore(blowdown, diameterM), {
        relativeTolerance: loose ? Math.max(looseTolerance, blowdown.run.relativeTolerance) : blowdown.run.relativeTolerance,
        isCancelled,
        counted,
      }),
    );
  const inFire = fire && toTarget(fire, limits);
  const fireAt = (diameterM: number, loose: boolean): Partial<SizingPoint> => {
    if (!inFire) return {};
    const { endedBy, endTimeS, peakVentRateKgPerS } = look(inFire, "fire", diameterM, loose);
    return { ...(endedBy === "pressure" ? { timeToTargetS: endTimeS } : {}), peakVentRateFireKgPerS: peakVentRateKgPerS };
  };
  const coldAt = (diameterM: number, loose: boolean): Partial<SizingPoint> => {
    if (!cold) return {};
    const { minimumWallTemperatureK, peakVentRateKgPerS } = look(cold, "cold", diameterM, loose);
    return {
      ...(minimumWallTemperatureK === undefined ? {} : { minimumWallTemperatureK }),
      peakVentRateColdKgPerS: peakVentRateKgPerS,
    };
  };
  const failed: Warning[] = [];
  const orNothing = (diameterM: number, work: () => Partial<SizingPoint>): Partial<SizingPoint> => {
    try {
      return work();
    } catch (error) {
      if (!(error instanceof EngineError) || error.code === "cancelled" || error.code === "invalid-case") throw error;
      failed.push({ code: "bore-not-computed", message: `${(1000 * diameterM).toPrecision(4)} mm: ${error.message}` });
      return {};
    }
  };
  const steel = (diameterM: number, loose: boolean): number =>
    coldAt(diameterM, loose).minimumWallTemperatureK ?? Number.POSITIVE_INFINITY;
  return {
    loose: (diameterM) => ({
      diameterM,
      ...orNothing(diameterM, () => fireAt(diameterM, true)),
      ...orNothing(diameterM, () => coldAt(diameterM, true)),
    }),
    tight: (diameterM) => ({ diameterM, ...fireAt(diameterM, false), ...coldAt(diameterM, false) }),
    looseSteelK: (diameterM) => steel(diameterM, true),
    tightSteelK: (diameterM) => steel(diameterM, false),
    tightTimeS: (diameterM) => fireAt(diameterM, false).timeToTargetS,
    counted,
    failed,
    isCancelled,
  };
}

/** The fire case, run only as far as it is asked about. */
function toTarget(fire: BlowdownCase, { targetPressurePa, targetTimeS }: SizingLimits): BlowdownCase {
  return {
    ...fire,
    run: {
      ...fire.run,
      stopPressurePa: targetPressurePa ?? fire.run.stopPressurePa,
      stopTimeS: slowest * (targetTimeS ?? fire.run.stopTimeS),
    },
  };
}

/** A refusal of one of the two cases names its place in the whole document. */
export function underPath<T>(name: "fire" | "cold", work: () => T): T {
  try {
    return work();
  } catch (error) {
    if (error instanceof EngineError && error.code !== "cancelled") throw error.at(error.path ? `${name}.${error.path}` : name);
    throw error;
  }
}

const points = 8;
const [below, above] = [0.6, 1.8];

/** Bores in equal ratios around the smallest that is fast enough, or around what the cold case has; with both figures of each. */
export function rowOfBores(
  { cold, rangeM, chosenDiameterM }: SizingCase,
  smallestM: number | undefined,
  lookUp: LookUp,
): SizingPoint[] {
  const middle = smallestM ?? chosenDiameterM ?? (cold?.release.path === "orifice" ? cold.release.diameterM : undefined);
  if (!rangeM && middle === undefined)
    throw new EngineError(
      "invalid-case",
      "There is no bore to start from. Give rangeM, chosenDiameterM or an orifice in the cold case.",
      {},
      "rangeM",
    );
  const [low, high] = rangeM ?? [below * (middle ?? 0), above * (middle ?? 0)];
  const bores = Array.from({ length: points }, (_, i) => low * (high / low) ** (i / (points - 1)));
  return bores.map((diameterM) => lookUp.loose(diameterM));
}

/**
 * One way out of the vessel: what passes it at a given state, and when it is open.
 *
 * A path opens at a time and, if it says so, closes at one; within a segment of a run it is either open or shut, so that the right-hand side
 * stays smooth. A relief device opens where the pressure rises to its set pressure and shuts where it falls to its reseating pressure, both found
 * as events; it opens and shuts at once.
 */
import type { FluidModel } from "../../eos/fluid-model";
import { EngineError } from "../../errors";
import { Throttle } from "../../flow/throttle";
import type { OutletPlace, ReleaseSpec } from "../blowdown-case";
import { makeOpening, type Opening } from "./opening";

export type ReleasePath = {
  opening: Opening;
  from: OutletPlace;
  /** Behind the opening, or behind its tail pipe. */
  backPressurePa: number;
  opensAtS: number;
  openingTimeS: number;
  closesAtS: number;
  relief: { setPressurePa: number; reseatPressurePa: number } | undefined;
  hasTailPipe: boolean;
  throttle: Throttle;
};

export function makeReleasePath(fluid: FluidModel, release: ReleaseSpec, place: string): ReleasePath {
  const { from, backPressurePa, openingTimeS, opensAtS = 0, closesAtS = Number.POSITIVE_INFINITY, tailPipe } = release;
  if (!(closesAtS > opensAtS))
    throw new EngineError("invalid-case", `It must close after it opens, at ${opensAtS} s.`, {}, `${place}.closesAtS`);
  const relief = release.path === "relief" ? release : undefined;
  if (relief && !(relief.reseatPressurePa < relief.setPressurePa && relief.reseatPressurePa > backPressurePa)) {
    throw new EngineError(
      "invalid-case",
      "The reseating pressure must lie between the back pressure and the set pressure, or the device flutters.",
      {},
      `${place}.reseatPressurePa`,
    );
  }
  return {
    opening: makeOpening(fluid, release, place),
    from,
    backPressurePa,
    opensAtS,
    openingTimeS: relief ? 0 : openingTimeS,
    closesAtS,
    relief: relief && { setPressurePa: relief.setPressurePa, reseatPressurePa: relief.reseatPressurePa },
    hasTailPipe: tailPipe !== undefined,
    throttle: new Throttle(fluid, backPressurePa),
  };
}

/** Part of its stroke that an open path has made. */
export function strokeAt({ opensAtS, openingTimeS }: ReleasePath, t: number): number {
  return openingTimeS > 0 ? Math.min(Math.max((t - opensAtS) / openingTimeS, 0), 1) : 1;
}

/** Which paths are open in the segment that starts at t, given which relief devices are. */
export const openPaths = (paths: readonly ReleasePath[], t: number, lifted: readonly boolean[]): boolean[] =>
  paths.map(({ opensAtS, closesAtS, relief }, i) => t >= opensAtS && t < closesAtS && (!relief || lifted[i] === true));

/** The next time after t at which a path changes by the clock. */
export function nextChangeS(paths: readonly ReleasePath[], t: number): number {
  let next = Number.POSITIVE_INFINITY;
  for (const { opensAtS, openingTimeS, closesAtS } of paths)
    for (const time of [opensAtS, opensAtS + openingTimeS, closesAtS]) if (time > t) next = Math.min(next, time);
  return next;
}

/** One case in, one result document out, whatever its kind. */
import { runBlowdown, type BlowdownOptions } from "./cases/blowdown/run-blowdown";
import type { BlowdownCase } from "./cases/blowdown-case";
import type { BlowdownResult, Confirmation } from "./cases/blowdown-result";
import { confirm } from "./cases/blowdown/confirm";
import type { EnergyCase, EnergyResult } from "./cases/energy-case";
import type { FlashCase, FlashResult } from "./cases/flash-case";
import type { NozzleCase, NozzleResult } from "./cases/nozzle-case";
import type { PathCase, PathResult } from "./cases/path-case";
import type { ReliefCase, ReliefResult } from "./cases/relief-case";
import type { SizingCase, SizingResult } from "./cases/sizing-case";
import type { Outcome, StudyCase, StudyResult } from "./cases/study-case";
import { runNozzle } from "./cases/nozzle/run-nozzle";
import { runEnergy } from "./energy/held-energy";
import { runFlash } from "./flash/run-flash";
import { runMethod, type MethodCase, type MethodResult } from "./methods/run-method";
import { runPath } from "./path/run-path";
import { runRelief } from "./relief/run-relief";
import { runSizing } from "./sizing/run-sizing";
import { assembleStudy, runStudy } from "./studies/run-study";

export type EngineCase =
  PathCase | FlashCase | NozzleCase | BlowdownCase | ReliefCase | EnergyCase | MethodCase | SizingCase | StudyCase;
export type EngineResult =
  | PathResult
  | FlashResult
  | NozzleResult
  | BlowdownResult
  | ReliefResult
  | EnergyResult
  | MethodResult
  | SizingResult
  | StudyResult;

export type RunContext = Pick<BlowdownOptions, "onProgress" | "isCancelled" | "coarse"> & {
  engineVersion: string;
  caseSha256: string;
  /** A clock in milliseconds, where the caller has one; the engine has none of its own. */
  now?: () => number;
};

/** Throws EngineError: the case is well formed but cannot be computed, or it was cancelled. */
export function runCase(document: BlowdownCase, context: RunContext): BlowdownResult;
export function runCase(document: EngineCase, context: RunContext): EngineResult;
export function runCase(document: EngineCase, context: RunContext): EngineResult {
  switch (document.kind) {
    case "path":
      return runPath(document);
    case "flash":
      return runFlash(document);
    case "nozzle":
      return runNozzle(document);
    case "method":
      return runMethod(document);
    case "blowdown":
      return stamp<BlowdownResult>(() => runBlowdown(document, context), context);
    case "relief":
      return stamp<ReliefResult>(() => runRelief(document), context);
    case "energy":
      return stamp<EnergyResult>(() => runEnergy(document), context);
    case "sizing":
      return stamp<SizingResult>(() => runSizing(document, context), context);
    case "study":
      return stamp<StudyResult>(() => runStudy(document, context), context);
  }
}

/** A blowdown and the same again at a tenfold tighter tolerance, with the change in the governing figures. */
export function runConfirmed(
  document: BlowdownCase,
  context: RunContext,
): { result: BlowdownResult; confirmation: Confirmation } {
  const half = (from: number) => (part: number) => context.onProgress?.(from + part / 2);
  const result = stamp<BlowdownResult>(() => runBlowdown(document, { ...context, onProgress: half(0) }), context);
  const relativeTolerance = result.numerics.relativeTolerance / 10;
  const tighter = stamp<BlowdownResult>(
    () => runBlowdown(document, { ...context, relativeTolerance, onProgress: half(0.5) }),
    context,
  );
  return { result, confirmation: confirm(result, tighter) };
}

/** A study from the outcomes of its parts. */
export function assembleParts(study: StudyCase, outcomes: readonly Outcome[], context: RunContext): StudyResult {
  return stamp<StudyResult>(() => assembleStudy(study, outcomes), context);
}

type Timed = { format: string; kind: string; engineVersion: string; caseSha256: string; numerics: { wallClockMs: number } };
/** A result before it is stamped; each of several kinds by itself. */
type Unstamped<Result extends Timed> = Result extends Timed
  ? Omit<Result, "engineVersion" | "caseSha256" | "numerics"> & { numerics: Omit<Result["numerics"], "wallClockMs"> }
  : never;

function stamp<Result extends Timed>(work: () => Unstamped<Result>, { engineVersion, caseSha256, now }: RunContext): Result {
  const started = now?.() ?? 0;
  const { format, kind, numerics, ...body } = work() as Unstamped<Timed>;
  const wallClockMs = (now?.() ?? 0) - started;
  const stamped: unknown = { format, kind, engineVersion, caseSha256, ...body, numerics: { ...numerics, wallClockMs } };
  return stamped as Result; // exactly what `Unstamped` had left out is put back
}

/**
 * Runs a study, whole or in parts.
 *
 *   planOf(study).runs               how many runs there are
 *   runPart(study, from, to)         outcomes of some of them; any worker, any order
 *   assembleStudy(study, outcomes)   the result, from all of them or from those that were done when it was cancelled
 *
 * A run that the engine refuses is an outcome: it is counted and named, never dropped.
 */
import type { Outcome, StudyCase, StudyResult } from "../cases/study-case";
import { EngineError } from "../errors";
import { assemblePercentiles } from "./percentiles";
import { outcomeOf, type StudyOptions } from "./figures";
import { planOf } from "./plan";
import { assembleSpread } from "./spread-study";
import { assembleTornado } from "./tornado";

export type StudyBody = StudyResult extends infer One
  ? One extends StudyResult
    ? Omit<One, "engineVersion" | "caseSha256" | "numerics"> & { numerics: Omit<One["numerics"], "wallClockMs"> }
    : never
  : never;

export function runStudy(study: StudyCase, options: StudyOptions = {}): StudyBody {
  return assembleStudy(study, runPart(study, 0, planOf(study).runs, options));
}

export function runPart(study: StudyCase, from: number, to: number, options: StudyOptions = {}): Outcome[] {
  const plan = planOf(study);
  const outcomes: Outcome[] = [];
  for (let index = from; index < Math.min(to, plan.runs); index++) {
    if (options.isCancelled?.()) throw new EngineError("cancelled", "The study was cancelled.");
    const document = plan.documentAt(index);
    outcomes.push(
      document
        ? outcomeOf(index, document, { ...options, withCurve: study.study === "spread" })
        : {
            index,
            evaluations: 0,
            refused: { code: "invalid-case", message: "The varied inputs leave no case that could be run." },
          },
    );
    options.onProgress?.((index + 1 - from) / (to - from));
  }
  return outcomes;
}

/** Throws what the unvaried case throws: without it there is nothing to compare with. */
export function assembleStudy(study: StudyCase, outcomes: readonly Outcome[]): StudyBody {
  const base = outcomes.find(({ index }) => index === 0);
  if (!base) throw new RangeError("a study without its unvaried run");
  if ("refused" in base)
    throw new EngineError("not-applicable", `The case itself cannot be computed: ${base.refused.message}`, {}, "of");
  switch (study.study) {
    case "spread":
      return assembleSpread(study, base, outcomes);
    case "tornado":
      return assembleTornado(study, base, outcomes);
    case "percentiles":
      return assemblePercentiles(study, base, outcomes);
  }
}

import { equationIds, type EquationId } from "../cases/fluid-spec";
import type { PathCase, PathResult } from "../cases/path-case";
import { EngineError } from "../errors";
import { fitness, type Fitness, type FitnessVerdict } from "../eos/fitness";
import { runPath } from "../path/run-path";

export interface ComparedChange {
  equation: EquationId;
  title: string;
  /** The worse of its fitness at the two ends. */
  verdict: FitnessVerdict;
  /** Of both ends, each said once. */
  notes: string[];
  result?: PathResult;
  /** Why this equation gives no change. */
  refused?: string;
}

const order: readonly FitnessVerdict[] = ["first", "fit", "uncertain", "comparison-only", "outside-range", "not-applicable"];

/**
 * The same change of state by every equation, in the order of the registry.
 *
 * Throws   EngineError "invalid-case" where the fluid or a state is wrong; an equation that cannot do it is listed with its reason
 */
export function compareChanges(document: PathCase): ComparedChange[] {
  const from = fitness(document.fluid, document.from);
  const to = fitness(document.fluid, document.to);
  return equationIds.flatMap((equation): ComparedChange[] => {
    const ends = [from, to].flatMap((list) => list.filter((entry) => entry.equation === equation));
    const [first] = ends;
    if (!first) return [];
    const base = { equation, title: first.title, verdict: worse(ends), notes: [...new Set(ends.flatMap(({ notes }) => notes))] };
    if (base.verdict === "not-applicable") return [{ ...base, refused: base.notes[0] ?? "The equation does not apply." }];
    try {
      return [{ ...base, result: runPath(withEquation(document, equation)) }];
    } catch (error) {
      if (error instanceof EngineError) return [{ ...base, refused: error.message }];
      throw error;
    }
  });
}

const worse = (ends: readonly Fitness[]): FitnessVerdict =>
  order[Math.max(...ends.map(({ verdict }) => order.indexOf(verdict)))] ?? "not-applicable";

/** Interaction lists are fitted to one equation: each other one takes its own published set. */
function withEquation(document: PathCase, equation: EquationId): PathCase {
  const { fluid } = document;
  const interaction = Array.isArray(fluid.interaction) && equation !== fluid.equation ? "library" : fluid.interaction;
  return { ...document, fluid: { ...fluid, equation, ...(interaction === undefined ? {} : { interaction }) } };
}

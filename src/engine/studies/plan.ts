/**
 * A study as a list of runs that do not depend on each other, so that several workers can share them.
 *
 *   run 0            the case as it is
 *   spread           then the case under each equation
 *   tornado          then each input low, each input high
 *   percentiles      then each sample
 */
import type { BlowdownCase } from "../cases/blowdown-case";
import { equationIds, type EquationId } from "../cases/fluid-spec";
import type { SampledInput, StudyCase, StudyInput } from "../cases/study-case";
import { EngineError } from "../errors";
import { valueAt } from "./distributions";
import { inputRules, inputsOf, unvaried, type InputId } from "./inputs";
import { latinHypercube } from "./latin-hypercube";

export type Varied = Partial<Record<InputId, number>>;
export type StudyPlan = {
  runs: number;
  /** Undefined where the variation leaves no case that could be run, which counts as refused. */
  documentAt: (index: number) => BlowdownCase | undefined;
  equations: EquationId[];
  inputs: SampledInput[];
  /** What was varied in a sample, from index 1. */
  variedAt: (index: number) => Varied;
};

/** Throws EngineError "invalid-case" with the path of an input that the case does not have or that has no range. */
export function planOf(study: StudyCase): StudyPlan {
  const { of } = study;
  switch (study.study) {
    case "spread": {
      const equations = study.equations ?? [...equationIds];
      return {
        runs: 1 + equations.length,
        documentAt: (index) => (index === 0 ? of : underEquation(of, equations[index - 1] ?? of.fluid.equation)),
        equations,
        inputs: [],
        variedAt: () => ({}),
      };
    }
    case "tornado": {
      const inputs = checked(of, study.inputs ?? usual(of)).map((one) => ({ ...one, distribution: "uniform" as const }));
      const variedAt = (index: number): Varied => {
        const one = inputs[(index - 1) % inputs.length];
        return index === 0 || !one ? {} : { [one.input]: index <= inputs.length ? one.low : one.high };
      };
      return { runs: 1 + 2 * inputs.length, documentAt: (index) => vary(of, variedAt(index)), equations: [], inputs, variedAt };
    }
    case "percentiles": {
      const inputs = checked(of, study.inputs ?? usual(of));
      const points = latinHypercube({ samples: study.samples, variables: inputs.length, seed: study.seed });
      const variedAt = (index: number): Varied => {
        const point = points[index - 1];
        if (!point) return {};
        return Object.fromEntries(inputs.map((one, k) => [one.input, valueAt(one, unvaried(one.input), point[k] ?? 0.5)]));
      };
      return { runs: 1 + study.samples, documentAt: (index) => vary(of, variedAt(index)), equations: [], inputs, variedAt };
    }
  }
}

function underEquation(of: BlowdownCase, equation: EquationId): BlowdownCase {
  // Interaction lists are fitted to one equation: each other one takes its own published set.
  const list = Array.isArray(of.fluid.interaction) && equation !== of.fluid.equation;
  const interaction = list ? "library" : of.fluid.interaction;
  return { ...of, fluid: { ...of.fluid, equation, ...(interaction === undefined ? {} : { interaction }) } };
}

function vary(of: BlowdownCase, varied: Varied): BlowdownCase | undefined {
  let document: BlowdownCase | undefined = of;
  for (const [input, by] of Object.entries(varied) as [InputId, number][])
    document = document && inputRules[input].vary(document, by);
  return document;
}

const usual = (of: BlowdownCase): SampledInput[] =>
  inputsOf(of).map((input) => {
    const { low, high, distribution } = inputRules[input];
    return { input, low, high, distribution };
  });

function checked<One extends StudyInput & { distribution?: SampledInput["distribution"] }>(
  of: BlowdownCase,
  inputs: One[],
): One[] {
  const had = inputsOf(of);
  if (inputs.length === 0)
    throw new EngineError("invalid-case", "There is nothing to vary. Name at least one input.", {}, "inputs");
  inputs.forEach(({ input, low, high, distribution }, i) => {
    const refuse = (message: string, key: string): never => {
      throw new EngineError("invalid-case", message, {}, `inputs[${i}].${key}`);
    };
    if (!had.includes(input)) refuse(`The case has no such input. It has ${had.join(", ")}.`, "input");
    if (inputs.findIndex((other) => other.input === input) < i) refuse("This input stands twice. Keep one.", "input");
    if (!(low < high)) refuse("The low end must lie below the high end.", "low");
    if (inputRules[input].mode === "factor" && low <= 0) refuse("This is a factor. Give a number above 0.", "low");
    if (distribution === "lognormal" && low <= 0) refuse("A lognormal input must be above 0.", "low");
  });
  return inputs;
}

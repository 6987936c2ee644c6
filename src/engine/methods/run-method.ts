/** One published method evaluated with a reviewer's own numbers: the case kind "method". */
import { EngineError } from "../errors";
import { chapters, type Method, type Outputs } from "./method";
import { readInputs } from "./read-inputs";
import { findMethod, methods } from "./registry";

export type MethodCase = {
  format: "ebbmark-case/1";
  kind: "method";
  title?: string | undefined;
  method: string;
  inputs: Readonly<Record<string, unknown>>;
};

export type MethodResult = {
  format: "ebbmark-result/1";
  kind: "method";
  method: string;
  title: string;
  /** As read, with defaults written out. */
  inputs: Readonly<Record<string, unknown>>;
  outputs: Outputs;
  source: string;
  /** TeX. */
  formula: string;
  /** Every stated bound holds for these numbers. */
  valid: boolean;
  warnings: { code: "outside-validity"; message: string }[];
  cautions: string[];
};

/** Throws   EngineError "invalid-case" with every fault of the inputs; any refusal of the method itself */
export function runMethod({ method: id, inputs: given }: MethodCase): MethodResult {
  const method = findMethod(id);
  if (!method) {
    throw new EngineError("invalid-case", `There is no method "${id}". List them with the command "methods".`, {}, "method");
  }
  const read = readInputs(method, given);
  if (!read.ok) throw EngineError.invalid(read.problems);
  const { outputs, broken } = method.evaluate(read.inputs);
  refuseNonsense(method, outputs);
  return {
    format: "ebbmark-result/1",
    kind: "method",
    method: id,
    title: method.title,
    inputs: read.inputs,
    outputs,
    source: method.source,
    formula: method.formula,
    valid: broken.length === 0,
    warnings: broken.map((message) => ({ code: "outside-validity", message })),
    cautions: [...method.cautions, methodCaution],
  };
}

const methodCaution =
  "One published method evaluated alone is no screening. A licensed engineer reviews it under the code that applies at the site before anyone relies on it.";

/** Inputs that each fit may together leave what a formula can give, such as a root of a negative number. */
function refuseNonsense(method: Method, outputs: Outputs): void {
  for (const [key, value] of Object.entries(outputs)) {
    const numbers = typeof value === "string" ? [] : typeof value === "number" ? [value] : value;
    if (numbers.some((one) => !Number.isFinite(one))) {
      throw new EngineError(
        "outside-validity",
        `With these inputs ${method.id} gives no number for ${method.outputs[key]?.title ?? key}. Check that they belong together.`,
        {},
        "inputs",
      );
    }
  }
}

/** What a list of methods tells of each: fields with units and ranges, formula, source and validity. */
export function describeMethods() {
  return methods.map(({ id, chapter, title, source, formula, inputs, outputs, validity, cautions }) => ({
    id,
    title,
    chapter: chapters[chapter],
    source,
    formula,
    inputs: Object.entries(inputs).map(([key, { kind, title: name, ...rest }]) => ({ key, title: name, kind, ...rest })),
    outputs: Object.entries(outputs).map(([key, { kind, symbol, title: name, unit }]) => ({
      key,
      title: name,
      kind,
      symbol,
      unit,
    })),
    validity,
    cautions,
  }));
}

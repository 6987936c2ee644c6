/**
 * A published method that can be evaluated on its own: its fields, its formula as typeset, where it comes from and where it holds.
 *
 * The formula itself lives in the room it belongs to and is called from here, so that a sheet and a reviewer evaluate the same function.
 */
import type { Field, InputsOf, OutputField, OutputsOf } from "./field";

export const chapters = {
  gas: "Real-gas energy",
  vessel: "Vessel and inventory",
  discharge: "Discharge",
  heat: "Heat transfer and transport properties",
  cold: "Low temperature, solids and hydrates",
  fire: "Fire",
  relief: "Relief devices",
  energy: "Held energy",
  disposal: "Disposal",
} as const;
export type Chapter = keyof typeof chapters;

/** A bound of validity: the words that state it, and whether it holds for these numbers. */
export type Bound<I, O> = { words: string; holds: (inputs: I, outputs: O) => boolean };

type Definition<I extends Record<string, Field>, O extends Record<string, OutputField>> = {
  id: string;
  chapter: Chapter;
  title: string;
  source: string;
  /** TeX. */
  formula: string;
  inputs: I;
  outputs: O;
  bounds?: readonly Bound<InputsOf<I>, OutputsOf<O>>[];
  cautions?: readonly string[];
  evaluate: (inputs: InputsOf<I>) => OutputsOf<O>;
};

export type Outputs = Readonly<Record<string, number | string | readonly number[]>>;
export type Evaluated = { outputs: Outputs; broken: readonly string[] };

/** What every method is, whatever its fields. `evaluate` takes inputs that were read by `readInputs`. */
export type Method = Readonly<{
  id: string;
  chapter: Chapter;
  title: string;
  source: string;
  formula: string;
  inputs: Readonly<Record<string, Field>>;
  outputs: Readonly<Record<string, OutputField>>;
  /** In words, where it holds. */
  validity: readonly string[];
  cautions: readonly string[];
  /** Outputs, and the bounds that these numbers break. Throws EngineError where nothing can be computed. */
  evaluate: (inputs: Readonly<Record<string, unknown>>) => Evaluated;
}>;

export function defineMethod<const I extends Record<string, Field>, const O extends Record<string, OutputField>>({
  bounds = [],
  cautions = [],
  evaluate,
  ...rest
}: Definition<I, O>): Method {
  return {
    ...rest,
    cautions,
    validity: bounds.map(({ words }) => words),
    evaluate: (given) => {
      const inputs = given as InputsOf<I>; // read by the fields above, see readInputs
      const outputs = evaluate(inputs);
      return { outputs, broken: bounds.filter(({ holds }) => !holds(inputs, outputs)).map(({ words }) => words) };
    },
  };
}

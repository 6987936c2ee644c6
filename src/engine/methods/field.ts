/** Fields of a method: what goes in and what comes out, each with its symbol, title and unit. Numbers are SI; the unit is also in the key. */

type Bounds = { min?: number; max?: number; above?: number; below?: number };
type Head = { symbol: string; title: string; unit: string };

export type NumberField = Head & Bounds & { kind: "number"; optional?: true; default?: number };
export type ChoiceField<C extends string = string> = { kind: "choice"; title: string; choices: readonly C[]; default?: C };
/** A list of numbers, such as a series over time. */
export type NumbersField = Head & Bounds & { kind: "numbers"; fewest: number; most: number };
/** Mole fractions by component id. */
export type CompositionField = { kind: "composition"; symbol: string; title: string };
export type Field = NumberField | ChoiceField | NumbersField | CompositionField;
export type OutputField = Head & { kind: "number" | "numbers" | "text" };

export const number = <const B extends Bounds & { default?: number; optional?: true } = Record<never, never>>(
  symbol: string,
  title: string,
  unit: string,
  bounds: B = {} as B,
) => ({ kind: "number" as const, symbol, title, unit, ...bounds });

export const numbers = (
  symbol: string,
  title: string,
  unit: string,
  bounds: Bounds & { fewest?: number; most?: number } = {},
): NumbersField => ({ kind: "numbers", symbol, title, unit, fewest: 1, most: 10_000, ...bounds });

export const oneOf = <const C extends string>(title: string, choices: readonly C[], otherwise?: C): ChoiceField<C> => ({
  kind: "choice",
  title,
  choices,
  ...(otherwise === undefined ? {} : { default: otherwise }),
});

export const composition = (title: string): CompositionField => ({ kind: "composition", symbol: "x_i", title });

export const gives = (symbol: string, title: string, unit: string): OutputField & { kind: "number" } => ({
  kind: "number",
  symbol,
  title,
  unit,
});
export const givesList = (symbol: string, title: string, unit: string): OutputField & { kind: "numbers" } => ({
  kind: "numbers",
  symbol,
  title,
  unit,
});
export const givesWord = (title: string): OutputField & { kind: "text" } => ({ kind: "text", symbol: "", title, unit: "" });

export type Composition = Readonly<Record<string, number>>;

type InputValue<F> = F extends { kind: "number" }
  ? F extends { optional: true }
    ? number | undefined
    : number
  : F extends ChoiceField<infer C>
    ? C
    : F extends { kind: "numbers" }
      ? readonly number[]
      : Composition;
export type InputsOf<I> = { readonly [K in keyof I]: InputValue<I[K]> };

type OutputValue<F> = F extends { kind: "number" } ? number : F extends { kind: "numbers" } ? readonly number[] : string;
export type OutputsOf<O> = { readonly [K in keyof O]: OutputValue<O[K]> };

/**
 * A line: one numbered value of a screening.
 *
 * The number is what remarks, cautions, errors, the log and the printed record cite; it never moves and is never reused.
 * `no` is the bare number ("4.03"). A value is kept under a key: the number alone for parts 1 to 4, with the case's letter before it for
 * parts 5 to 7 ("A5.02"), and with "-1", "-2" … after it where items repeat ("2.04-1").
 */
import type { QuantityId } from "@/engine/units";
import type { PartNumber } from "./parts";

export type LineNo = `${PartNumber}.${string}`;
export type LineKey = string;

/** What a line's value depends on: reads the SI value or the chosen word of another line of the same case and item. */
export type LineReader = {
  choice(no: LineNo): string | undefined;
  si(no: LineNo): number | undefined;
  /** Whether the choice is made in any case: for lines that stand once for all cases and follow one that each case makes. */
  inAnyCase(no: LineNo, choice: string): boolean;
};

type Common = {
  no: LineNo;
  part: PartNumber;
  /** Heading of the group the line stands under in its part. */
  group: string;
  label: string;
  /** Small type under the label. */
  hint?: string;
  /** Repeats once for each item of the inventory (key suffix "-1"). */
  perItem?: true;
  /** Present on the form only when this holds; absent lines are not asked for and not stored in the case. */
  asked?: (read: LineReader) => boolean;
  /** A line that may stay empty. */
  optional?: true;
  /** No source is asked for (names, choices of method). */
  sourceFree?: true;
};

/** A number with a unit. `min` and `max` are SI and inclusive unless `exclusiveMin` says otherwise; pressures are absolute. */
export type QuantityLine = Common & {
  kind: "quantity";
  quantity: QuantityId;
  min: number;
  max: number;
  exclusiveMin?: true;
  /** Units first shown in each system, by their symbols in the unit table. */
  shown: { SI: string; US: string };
  /** Filled for a new draft, in SI, with an assumed source that says why. */
  initial?: { si: number; why: string };
};

export type TextLine = Common & { kind: "text"; maxLength: number; initialText?: string };

export type ChoiceLine = Common & {
  kind: "choice";
  options: readonly { value: string; label: string; phrase?: string }[];
  initial?: string;
  /** Drawn as one row of radios, because it decides which lines follow. */
  radios?: true;
};

/** Computed from other lines; shown dashed, never typed. */
export type DerivedLine = Common & { kind: "derived"; quantity: QuantityId; shown: { SI: string; US: string } };

/** The composition table of part 3. */
export type CompositionLine = Common & { kind: "composition" };

export type Line = QuantityLine | TextLine | ChoiceLine | DerivedLine | CompositionLine;

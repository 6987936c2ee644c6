/**
 * What a line of the form accepts, as yup schemas made from the registry: the one place where a line's rules become validation. Texts are
 * written in the unit in use, with the range that holds.
 */
import * as yup from "yup";
import { formatForField, withUnit } from "@/components/quantity/format";
import type { DraftDocument, LineValue } from "@/contracts/draft";
import { askedKeys } from "@/contracts/draft";
import type { SiteFacts } from "@/contracts/draft-to-case";
import type { ChoiceLine, LineKey, QuantityLine, TextLine } from "@/contracts/lines/line";
import { readQuantity } from "@/engine/read-quantity";

export type LineErrors = Record<LineKey, string>;

/** Unit that a line is shown in at the moment. */
export type UnitInUse = (key: LineKey, line: QuantityLine) => string;

type Rules = { unit: string; barometricPressurePa: number };

const lineValue = () => yup.mixed<LineValue>();

/** An empty line is not wrong: it is missing, which the part list and the button say. */
export function quantitySchema(line: QuantityLine, { unit, barometricPressurePa }: Rules) {
  return lineValue().test("number", function check(value) {
    if (!value || value.typed.trim() === "") return true;
    const read = readQuantity(value.typed, { quantity: line.quantity, unit: value.unit ?? unit, barometricPressurePa });
    if (!read.ok) return this.createError({ message: read.problem });
    const tooLow = line.exclusiveMin ? read.si <= line.min : read.si < line.min;
    if (!tooLow && read.si <= line.max) return true;
    return this.createError({ message: rangeSentence(line, tooLow, { unit, barometricPressurePa }) });
  });
}

function rangeSentence(line: QuantityLine, tooLow: boolean, { unit, barometricPressurePa }: Rules): string {
  const [low, high] = [line.min, line.max].map((si) => formatForField(line.quantity, si, unit, barometricPressurePa));
  const range = withUnit(`${line.exclusiveMin ? "above " : ""}${low} to ${high}`, unit);
  return `This is too ${tooLow ? "low" : "high"} for “${line.label.toLowerCase()}”: ${range} can be computed. Check figure and unit.`;
}

export const textSchema = (line: TextLine) =>
  lineValue().test(
    "length",
    `At most ${line.maxLength} characters fit here. Shorten the text.`,
    (value) => (value?.typed.length ?? 0) <= line.maxLength,
  );

export const choiceSchema = (line: ChoiceLine) =>
  lineValue().test(
    "choice",
    "This is not one of the choices of this line. Choose again.",
    (value) => !value?.typed || line.options.some((option) => option.value === value.typed),
  );

/** Messages by line of everything typed in lines that are asked for now. */
export function lineErrors(draft: DraftDocument, site: SiteFacts, unitInUse: UnitInUse): LineErrors {
  const errors: LineErrors = {};
  for (const { key, line } of askedKeys(draft)) {
    if (line.kind === "derived" || line.kind === "composition") continue;
    const schema =
      line.kind === "quantity"
        ? quantitySchema(line, { unit: unitInUse(key, line), barometricPressurePa: site.barometricPressurePa })
        : line.kind === "text"
          ? textSchema(line)
          : choiceSchema(line);
    const message = messageOf(() => schema.validateSync(draft.lines[key]));
    if (message) errors[key] = message;
  }
  return errors;
}

function messageOf(validate: () => unknown): string | undefined {
  try {
    validate();
    return undefined;
  } catch (error) {
    if (error instanceof yup.ValidationError) return error.message;
    throw error;
  }
}

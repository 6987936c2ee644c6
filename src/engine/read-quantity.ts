/**
 * Reads what people type: a number, and a unit if they wrote one ("1.24 in", "319 psig", "25 barg", "−20 F", "1 450").
 *
 * The decimal sign is a point. A comma is refused with a hint, because "1,500" is fifteen hundred to one reader and one and a half to
 * another; a caller that has shown its user the choice (a pasted table, an upload) may say `decimalComma`.
 */
import { standardAtmospherePa, toSi, unitSymbols, units, type QuantityId, type Unit } from "./units";

export type ReadQuantity = { ok: true; si: number; value: number; unit: string } | { ok: false; problem: string };

export type ReadOptions = {
  quantity: QuantityId;
  /** Unit that counts where none was typed. */
  unit: string;
  barometricPressurePa?: number;
  decimalComma?: boolean;
};

const anySpace = /[\s\u00a0\u2000-\u200b\u202f\u205f\u3000]+/g;
const numberThenUnit = /^([+-]?[\d., ]*\d[.,]?(?:e[+-]?\d+)?|[+-]?[.,]\d+(?:e[+-]?\d+)?)\s*(.*)$/i;
const grouped = /^[+-]?\d{1,3}(?: \d{3})+(?:\.\d+)?$/;
const plain = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?$/i;

/** Parses `typed`. Never throws on what a person can type: a refusal is a sentence that says what is wrong and what to do. */
export function readQuantity(typed: string, options: ReadOptions): ReadQuantity {
  const text = typed
    .replace(/[\u2212\u2012\u2013\ufe63\uff0d](?=\s*[\d.])/g, "-")
    .replace(anySpace, " ")
    .trim();
  if (text === "") return refuse("Nothing is entered. Type a number.");

  const match = numberThenUnit.exec(text.replace(/^([+-]) /, "$1"));
  if (!match) return refuse(`"${typed.trim()}" has no number in front. Type a number, then the unit if it differs.`);
  const [, digits = "", unitText = ""] = match;

  const value = readNumber(digits.trim(), options.decimalComma ?? false);
  if (typeof value === "string") return refuse(value);

  const unit = unitText === "" ? options.unit : findUnit(options.quantity, unitText);
  if (unit === undefined) return refuse(unknownUnit(options.quantity, unitText));

  const si = toSi(options.quantity, value, unit, options.barometricPressurePa ?? standardAtmospherePa);
  if (!Number.isFinite(si)) return refuse(`${digits.trim()} is too large to compute with. Check the number of digits.`);
  return { ok: true, si, value, unit };
}

const refuse = (problem: string): ReadQuantity => ({ ok: false, problem });

function readNumber(digits: string, decimalComma: boolean): number | string {
  let text = digits;
  if (text.includes(",")) {
    if (!decimalComma || text.includes(".") || text.indexOf(",") !== text.lastIndexOf(",")) {
      return `"${digits}" has a comma, which can be read two ways. Write a decimal point (1.5) and no comma between thousands (1500).`;
    }
    text = text.replace(",", ".");
  }
  if (grouped.test(text)) text = text.replaceAll(" ", "");
  if (!plain.test(text)) return `"${digits}" is not one number. Write it with digits and at most one decimal point.`;
  const value = Number(text);
  return Number.isFinite(value) ? value : `${digits} is too large to compute with. Check the number of digits.`;
}

const bare = (text: string): string =>
  text
    .toLowerCase()
    .replace(/\^?2(?!\d)/g, "²")
    .replace(/\^?3(?!\d)/g, "³")
    .replace(/[\s.·*×⋅]/g, "");

/** Symbol of the table that `text` means, or undefined. An exact symbol wins, so that MW is not read as mW. */
export function findUnit(quantity: QuantityId, text: string): string | undefined {
  const shown: Record<string, Unit> = units[quantity].shown;
  if (Object.hasOwn(shown, text)) return text;
  const wanted = bare(text);
  return Object.keys(shown).find((symbol) => [symbol, ...(shown[symbol]?.aliases ?? [])].some((name) => bare(name) === wanted));
}

function unknownUnit(quantity: QuantityId, text: string): string {
  const known = unitSymbols(quantity).join(", ");
  if (quantity === "pressure" && (bare(text) === "bar" || bare(text) === "psi")) {
    const unit = bare(text);
    return `${text} leaves open whether it is gauge or absolute. Write ${unit === "bar" ? "bar(g) or bar(a)" : "psig or psia"}.`;
  }
  return `"${text}" is no unit of ${units[quantity].title} here. Use one of ${known}.`;
}

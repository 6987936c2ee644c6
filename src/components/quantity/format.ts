/**
 * Every number that a person reads is written here: decimal point, U+2212 for minus, groups of three from five digits with U+202F, and a
 * space that never breaks before the unit. A value that is missing or not a number is an en dash; nothing ever reads NaN.
 */
import { fromSi, type QuantityId } from "@/engine/units";
import { decimalsFor, precisionOf, type Precision } from "./precision";

const minus = "\u2212";
const narrowSpace = "\u202f";
const fixedSpace = "\u00a0";
export const missing = "–";

export type Shown = { number: string; unit: string; text: string };

type Options = {
  /** Datum of gauge units, Pa absolute. */
  barometricPressurePa?: number;
  /** Writes a plus before positive values: for changes only. */
  signed?: boolean;
  /** Adds figures until a value that isn't zero doesn't read as zero: for distances left to a limit. */
  neverZero?: boolean;
};

/** A number at a precision: 12345.67 reads "12 345.67" at two decimals, −0.04 reads "0.0" at one. Exactly zero reads "0". */
export function formatNumber(value: number | null | undefined, precision: Precision, options: Options = {}): string {
  if (value == null || !Number.isFinite(value)) return missing;
  if (value === 0) return "0";

  let decimals = decimalsFor(value, precision);
  while (options.neverZero && decimals < 12 && Number(value.toFixed(decimals)) === 0) decimals += 1;
  return atDecimals(value, decimals, options.signed);
}

/** A value of a quantity in one of its units. `number` and `unit` stand apart for tables, `text` is both. */
export function formatQuantity(quantity: QuantityId, si: number | null | undefined, unit: string, options: Options = {}): Shown {
  if (si == null || !Number.isFinite(si)) return { number: missing, unit: "", text: missing };
  const number = formatNumber(fromSi(quantity, si, unit, options.barometricPressurePa), precisionOf(quantity, unit), options);
  return { number, unit: unit === missing ? "" : unit, text: withUnit(number, unit) };
}

/** "12.7 kg/s", with a space that does not break; a pure number stands alone. */
export const withUnit = (number: string, unit: string): string =>
  number === missing || unit === missing || unit === "" ? number : `${number}${fixedSpace}${unit}`;

/**
 * A value beside its limit, in one unit. Rounding never hides which side the value is on: figures are added to both until it shows.
 * A value equal to its limit reads as equal.
 */
export function formatAgainst(
  quantity: QuantityId,
  pair: { si: number; limitSi: number },
  unit: string,
  options: Options = {},
): { value: Shown; limit: Shown } {
  const value = fromSi(quantity, pair.si, unit, options.barometricPressurePa);
  const limit = fromSi(quantity, pair.limitSi, unit, options.barometricPressurePa);
  const precision = precisionOf(quantity, unit);

  let valueDecimals = decimalsFor(value, precision);
  let limitDecimals = decimalsFor(limit, precision);
  const sideShown = () => Math.sign(Number(value.toFixed(valueDecimals)) - Number(limit.toFixed(limitDecimals)));
  // Sides are judged in SI, where verdicts are; conversion may round a hair's breadth away.
  const side = Math.sign(pair.si - pair.limitSi);
  while (sideShown() !== side && Math.max(valueDecimals, limitDecimals) < 12) {
    valueDecimals = limitDecimals = Math.max(valueDecimals, limitDecimals) + 1;
  }
  const shown = (number: string): Shown => ({ number, unit, text: withUnit(number, unit) });
  return { value: shown(atDecimals(value, valueDecimals)), limit: shown(atDecimals(limit, limitDecimals)) };
}

/** "8.5 to 12.0 °C": both ends at the finer of their decimals. */
export function formatRange(
  quantity: QuantityId,
  si: { low: number; high: number },
  unit: string,
  options: Options = {},
): string {
  const low = fromSi(quantity, si.low, unit, options.barometricPressurePa);
  const high = fromSi(quantity, si.high, unit, options.barometricPressurePa);
  const precision = precisionOf(quantity, unit);
  const decimals = Math.max(decimalsFor(low, precision), decimalsFor(high, precision));
  return withUnit(`${atDecimals(low, decimals)} to ${atDecimals(high, decimals)}`, unit);
}

/**
 * A stored value written into a field in the unit chosen there: up to six figures, at least what is shown elsewhere, without groups.
 * What a person typed is never replaced by this while its unit stands.
 */
export function formatForField(quantity: QuantityId, si: number, unit: string, barometricPressurePa?: number): string {
  const value = fromSi(quantity, si, unit, barometricPressurePa);
  if (!Number.isFinite(value)) return "";
  if (value === 0) return "0";
  const exact = trimmedDecimals(Number(value.toPrecision(6)));
  const usual = decimalsFor(value, precisionOf(quantity, unit));
  // Padding zeros up to the usual precision claims no more than is there, since six figures were kept.
  const decimals = quantity === "fraction" ? exact : Math.max(exact, usual);
  return atDecimals(value, decimals).replaceAll(narrowSpace, "");
}

/** A ratio in whole per cent ("9 %"); a share that isn't zero never reads "0 %". */
export const formatPercent = (ratio: number | null | undefined): string =>
  ratio == null || !Number.isFinite(ratio) ? missing : withUnit(formatNumber(ratio * 100, {}, { neverZero: true }), "%");

/** Mole fraction in mol %, three decimals as after normalising. */
export const formatMolePercent = (moleFraction: number): string =>
  Number.isFinite(moleFraction) ? atDecimals(moleFraction * 100, 3) : missing;

/** Mantissa and exponent of a value far from one, for `<Power />`: 2e-6 gives "2" and "−6" at one figure. */
export function formatPower(value: number, figures = 2): { mantissa: string; exponent: string } {
  const [mantissa = "", exponent = "0"] = value.toExponential(figures - 1).split("e");
  return { mantissa: proper(mantissa), exponent: proper(exponent.replace("+", "")) };
}

/** What goes to the clipboard: plain ASCII where a spreadsheet would stumble. */
export const plainText = (shown: string): string =>
  shown.replaceAll(minus, "-").replaceAll(narrowSpace, "").replaceAll(fixedSpace, " ").replaceAll("\u2009", " ");

function atDecimals(value: number, decimals: number, signed = false): string {
  const fixed = value.toFixed(decimals);
  const isZero = Number(fixed) === 0;
  const digits = fixed.replace("-", "");
  const [whole = "0", fraction] = digits.split(".");
  const grouped = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+$)/g, narrowSpace) : whole;
  const sign = isZero ? "" : value < 0 ? minus : signed ? "+" : "";
  return `${sign}${grouped}${fraction === undefined ? "" : `.${fraction}`}`;
}

const proper = (text: string): string => text.replace("-", minus);

const trimmedDecimals = (value: number): number => {
  const text = Math.abs(value) < 1e-6 ? value.toFixed(12) : String(value);
  return text.includes("e") ? 0 : (text.split(".")[1]?.replace(/0+$/, "").length ?? 0);
};

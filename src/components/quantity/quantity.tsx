"use client";

import { useCallback } from "react";
import type { QuantityId } from "@/engine/units";
import { useUnits } from "../units/units-provider";
import { formatPower, formatQuantity, type Shown } from "./format";
import { shownUnit } from "./shown-units";

type Choice = { unit?: { SI: string; US: string }; signed?: boolean; neverZero?: boolean };

/** Formats SI values in the system the person has chosen, gauge pressures against the site's barometer. */
export function useShown(): (quantity: QuantityId, si: number | null | undefined, choice?: Choice) => Shown {
  const { system, barometricPressurePa } = useUnits();
  return useCallback(
    (quantity, si, { unit, ...options } = {}) =>
      formatQuantity(quantity, si, unit?.[system] ?? shownUnit(quantity, system), { barometricPressurePa, ...options }),
    [system, barometricPressurePa],
  );
}

/** A value with its unit, never broken over two lines. `unit` overrides the usual units of the quantity. */
export function Quantity({ quantity, si, ...choice }: { quantity: QuantityId; si: number | null | undefined } & Choice) {
  return <span className="whitespace-nowrap">{useShown()(quantity, si, choice).text}</span>;
}

/** A value far from one: 2 × 10 to the −6. The exponent is set as a superscript, which every font has. */
export function Power({ value, figures }: { value: number; figures?: number }) {
  const { mantissa, exponent } = formatPower(value, figures);
  return (
    <span className="whitespace-nowrap">
      {mantissa}
      {"\u00a0×\u00a0"}10<sup>{exponent}</sup>
    </span>
  );
}

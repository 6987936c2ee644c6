"use client";

import { useId } from "react";
import { useLine } from "./line-context";
import { lineValueMark } from "./next-line";
import { radioLook } from "./radio-look";

export type RadioOption = { value: string; label: string; phrase?: string };

type Props = {
  value: string;
  options: readonly RadioOption[];
  onValueChange?: (value: string) => void;
  readOnly?: boolean;
  /** Side by side over the whole width, for a choice that decides which lines follow. */
  across?: boolean;
  /** Where no `<Line group>` stands around. */
  label?: string;
};

/** A choice that changes which lines follow: radios, each with a phrase that says what it means. */
export function RadioRow({ value, options, onValueChange, readOnly, across = false, label }: Props) {
  const line = useLine();
  const name = useId();
  const locked = readOnly || line?.tone === "locked";

  return (
    <div
      role="radiogroup"
      id={line?.valueId}
      aria-labelledby={line?.labelId}
      aria-label={line ? undefined : label}
      aria-describedby={line?.describedBy}
      className={across ? "grid grid-cols-[repeat(auto-fit,minmax(160px,1fr))] phone:grid-cols-1" : undefined}
    >
      {options.map((option) => (
        <label
          key={option.value}
          className={`grid min-h-[34px] cursor-pointer grid-cols-[22px_minmax(0,1fr)] items-start gap-2.5 phone:min-h-[44px] phone:py-2 ${
            across
              ? "border-l px-3 py-2.5 first:border-l-0 has-[:checked]:bg-tide-wash has-[:checked]:shadow-[inset_0_3px_0_var(--tide)] phone:border-l-0 phone:border-t"
              : "py-1"
          }`}
        >
          <input
            {...lineValueMark}
            type="radio"
            name={name}
            className={radioLook}
            checked={value === option.value}
            disabled={locked && value !== option.value}
            onChange={() => onValueChange?.(option.value)}
          />
          <span>
            {option.label}
            {option.phrase && <small className="block text-label text-ink-3">{option.phrase}</small>}
          </span>
        </label>
      ))}
    </div>
  );
}

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
  /** Where no `<Line group>` stands around. */
  label?: string;
};

/** A choice that changes which lines follow: radios, each with a phrase that says what it means. */
export function RadioRow({ value, options, onValueChange, readOnly, label }: Props) {
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
    >
      {options.map((option) => (
        <label
          key={option.value}
          className="grid min-h-[34px] cursor-pointer grid-cols-[22px_minmax(0,1fr)] items-start gap-2.5 py-1 phone:min-h-[44px] phone:py-2"
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

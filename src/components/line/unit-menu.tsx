"use client";

import { Chevron } from "./chevron";

type Props = { unit: string; units: readonly string[]; label: string; onChange?: (unit: string) => void };

/** The unit behind a value: plain text, or a menu where there is a choice; nothing where a head of the column says it. */
export function UnitMenu({ unit, units, label, onChange }: Props) {
  if (unit === "") return null;
  if (units.length < 2 || !onChange) {
    return <span className="field-unit flex min-w-[64px] items-center border-l px-2 text-note text-ink-2">{unit}</span>;
  }
  return (
    <span className="field-unit relative flex min-w-[64px] items-stretch border-l text-note text-ink-2">
      <select
        aria-label={label}
        value={unit}
        onChange={(event) => onChange(event.target.value)}
        className="w-full bg-transparent py-0 pl-2 pr-6 text-ink-2"
      >
        {units.map((option) => (
          <option key={option} value={option} className="bg-field text-ink">
            {option}
          </option>
        ))}
      </select>
      <Chevron />
    </span>
  );
}

"use client";

import { Chevron } from "./chevron";
import { fieldBox } from "./field-tone";
import { useLine, type LineTone } from "./line-context";
import { focusNextLine, lineValueMark } from "./next-line";

export type Choice = { value: string; label: string };

type Props = {
  value: string;
  options: readonly Choice[];
  onValueChange?: (value: string) => void;
  /** Shown while nothing is chosen; the list then opens with it. */
  prompt?: string;
  readOnly?: boolean;
  id?: string;
  label?: string;
  describedBy?: string;
  tone?: LineTone;
};

/** One of a few words. A native list, so that keys, phones and screen readers know it. Read-only it is plain text. */
export function ChoiceField({ value, options, onValueChange, prompt, readOnly, id, label, describedBy, tone }: Props) {
  const line = useLine();
  const shownTone = tone ?? line?.tone ?? "rest";
  const fixed = readOnly || shownTone === "derived" || shownTone === "locked";

  if (fixed) {
    return (
      <div className={fieldBox[shownTone]}>
        <input
          {...(line ? lineValueMark : {})}
          id={id ?? line?.valueId}
          className="field-value words"
          aria-label={label}
          aria-describedby={describedBy ?? line?.describedBy}
          readOnly
          value={options.find((option) => option.value === value)?.label ?? value}
        />
      </div>
    );
  }

  return (
    <div className={`${fieldBox[shownTone]} relative`}>
      <select
        {...(line ? lineValueMark : {})}
        id={id ?? line?.valueId}
        className="field-value words !pr-7"
        aria-label={label}
        aria-describedby={describedBy ?? line?.describedBy}
        aria-invalid={shownTone === "bad" || undefined}
        value={value}
        onChange={(event) => onValueChange?.(event.target.value)}
        onKeyDown={(event) => {
          if (!line || event.key !== "Enter") return;
          event.preventDefault();
          focusNextLine(event.currentTarget);
        }}
      >
        {prompt !== undefined && (
          <option value="" disabled={value !== ""} className="bg-field text-ink">
            {prompt}
          </option>
        )}
        {options.map((option) => (
          <option key={option.value} value={option.value} className="bg-field text-ink">
            {option.label}
          </option>
        ))}
      </select>
      <Chevron />
    </div>
  );
}

"use client";

import type { ComponentPropsWithRef } from "react";
import { fieldBox } from "./field-tone";
import { useLine, type LineTone } from "./line-context";
import { focusNextLine, lineValueMark } from "./next-line";

type Props = Omit<ComponentPropsWithRef<"input">, "className" | "style" | "value" | "onChange" | "type"> & {
  value: string;
  onValueChange?: (text: string) => void;
  onLeave?: () => void;
  type?: "text" | "email" | "search" | "date";
  tone?: LineTone;
  /** Where no `<Line>` or `<label>` names it. */
  label?: string;
};

/** One line of words. Inside a `<Line>` it takes name, description and tone from there, and Enter goes to the next line. */
export function TextField({ value, onValueChange, onLeave, tone, label, readOnly, type = "text", ...rest }: Props) {
  const line = useLine();
  const shownTone = tone ?? line?.tone ?? "rest";

  return (
    <div className={fieldBox[shownTone]}>
      <input
        {...(line ? lineValueMark : {})}
        {...rest}
        id={rest.id ?? line?.valueId}
        type={type}
        className="field-value words"
        aria-label={label}
        aria-describedby={rest["aria-describedby"] ?? line?.describedBy}
        aria-invalid={shownTone === "bad" || undefined}
        readOnly={readOnly || shownTone === "derived" || shownTone === "locked"}
        value={value}
        onChange={(event) => onValueChange?.(event.target.value)}
        onBlur={(event) => {
          rest.onBlur?.(event);
          onLeave?.();
        }}
        onKeyDown={(event) => {
          rest.onKeyDown?.(event);
          if (!line || event.key !== "Enter" || event.nativeEvent.isComposing) return;
          event.preventDefault();
          // Moving on leaves the value by itself; at the last line nothing else would.
          if (!focusNextLine(event.currentTarget)) onLeave?.();
        }}
      />
    </div>
  );
}

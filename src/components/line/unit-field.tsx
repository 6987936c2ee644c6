"use client";

import type { ClipboardEventHandler, Ref } from "react";
import { fieldBox } from "./field-tone";
import { useLine, type LineTone } from "./line-context";
import { focusNextLine, lineValueMark } from "./next-line";
import { UnitMenu } from "./unit-menu";

type Props = {
  /** What stands in the field: the text as typed, or a shown value. Reading it is the caller's. */
  value: string;
  unit: string;
  /** Units the menu offers; with one or none the unit is plain text. */
  units?: readonly string[];
  onValueChange?: (typed: string) => void;
  onUnitChange?: (unit: string) => void;
  /** On leaving the value, and before Enter moves on. */
  onLeave?: () => void;
  onPaste?: ClipboardEventHandler<HTMLInputElement>;
  readOnly?: boolean;
  placeholder?: string;
  /** Only where no `<Line>` stands around: in tables, with its own name. */
  label?: string;
  id?: string;
  describedBy?: string;
  tone?: LineTone;
  inputRef?: Ref<HTMLInputElement>;
};

/**
 * A number and its unit. The value is right-aligned; any unit may be typed behind it, and the caller converts. Enter goes to the next
 * line's value, Tab to the unit. Inside a `<Line>` it takes name, description and tone from there.
 */
export function UnitField({
  value,
  unit,
  units = [],
  onValueChange,
  onUnitChange,
  onLeave,
  onPaste,
  readOnly,
  placeholder,
  label,
  id,
  describedBy,
  tone: ownTone,
  inputRef,
}: Props) {
  const line = useLine();
  const tone = ownTone ?? line?.tone ?? "rest";
  const fixed = readOnly || tone === "derived" || tone === "locked";

  return (
    <div className={fieldBox[tone]}>
      <input
        {...lineValueMark}
        ref={inputRef}
        id={id ?? line?.valueId}
        type="text"
        inputMode="text"
        autoComplete="off"
        spellCheck={false}
        className="field-value"
        aria-label={line ? undefined : label}
        aria-describedby={describedBy ?? line?.describedBy}
        aria-invalid={tone === "bad" || undefined}
        placeholder={placeholder}
        readOnly={fixed}
        value={value}
        onChange={(event) => onValueChange?.(event.target.value)}
        onPaste={onPaste}
        onBlur={onLeave}
        onKeyDown={(event) => {
          if (event.key !== "Enter" || event.nativeEvent.isComposing) return;
          event.preventDefault();
          // Moving on leaves the value by itself; at the last line nothing else would.
          if (!focusNextLine(event.currentTarget)) onLeave?.();
        }}
      />
      <UnitMenu unit={unit} units={units} label={`Unit of ${line?.label ?? label ?? "the value"}`} onChange={onUnitChange} />
    </div>
  );
}

"use client";

import { Line } from "@/components/line/line";
import { UnitField } from "@/components/line/unit-field";
import type { LineKey, QuantityLine } from "@/contracts/lines/line";
import { unitSymbols } from "@/engine/units";
import { useDraft } from "./draft-context";
import { otherText, shownText, unitTyped } from "./shown-unit";
import { SourceField } from "./source-field";
import { usePasteColumn } from "./use-paste-column";

/** A number with its unit and its source. Typing keeps the text; the SI value beside it follows; choosing a unit changes what is shown only. */
export function QuantityRow({ line, lineKey }: { line: QuantityLine; lineKey: LineKey }) {
  const { draft, editable, errors, made, setLine, unitOf, chooseUnit, subject } = useDraft();
  const baro = subject.site.barometricPressurePa;
  const value = draft.lines[lineKey];
  const unit = unitOf(lineKey, line);
  const pasteColumn = usePasteColumn(lineKey);

  const error = errors[lineKey] ?? made.problems.find((problem) => problem.line === lineKey)?.message;
  const assumed = value?.source?.kind === "assumed";
  const hasValue = value !== undefined && (value.typed.trim() !== "" || value.si !== null);

  return (
    <Line
      no={lineKey}
      label={line.label}
      hint={line.optional && !line.hint ? "may stay empty" : line.hint}
      other={otherText(line, value, unit, baro)}
      message={error ? { tone: "bad", text: error } : undefined}
      tone={!editable ? "locked" : "rest"}
      source={
        <SourceField
          lineNo={lineKey}
          label={line.label}
          source={value?.source ?? null}
          asksFor={hasValue && !line.sourceFree}
          editable={editable}
          onChange={(source) => setLine(lineKey, { source })}
        />
      }
    >
      <UnitField
        value={shownText(line, value, unit, baro)}
        unit={unit}
        units={unitSymbols(line.quantity)}
        tone={error ? "bad" : !editable ? "locked" : assumed ? "warn" : "rest"}
        onValueChange={(typed) => setLine(lineKey, { typed, unit })}
        onUnitChange={(chosen) => chooseUnit(lineKey, chosen)}
        onPaste={pasteColumn}
        onLeave={() => {
          const moved = value && unitTyped(line, value, baro);
          if (!moved) return;
          setLine(lineKey, moved);
          chooseUnit(lineKey, moved.unit);
        }}
      />
    </Line>
  );
}

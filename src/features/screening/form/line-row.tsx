"use client";

import { ChoiceField } from "@/components/line/choice-field";
import { Line, type LineMessage } from "@/components/line/line";
import { RadioRow } from "@/components/line/radio-row";
import { TextField } from "@/components/line/text-field";
import { UnitField } from "@/components/line/unit-field";
import { formatForField } from "@/components/quantity/format";
import { useUnits } from "@/components/units/units-provider";
import { derivedValue } from "@/contracts/draft-derived";
import { policyLimit } from "@/contracts/policy-limit";
import type { ChoiceLine, DerivedLine, Line as RegisteredLine, LineKey, TextLine } from "@/contracts/lines/line";
import { CompositionTable } from "./composition-table";
import { useDraft } from "./draft-context";
import { PolicyLine } from "./policy-line";
import { QuantityRow } from "./quantity-row";
import { SourceField } from "./source-field";

/** One line of the registry as a row of the form. */
export function LineRow({ line, lineKey }: { line: RegisteredLine; lineKey: LineKey }) {
  const { subject } = useDraft();
  switch (line.kind) {
    case "quantity":
      return policyLimit(line.no, subject.site) === undefined ? (
        <QuantityRow line={line} lineKey={lineKey} />
      ) : (
        <PolicyLine line={line} lineKey={lineKey} />
      );
    case "text":
      return <TextRow line={line} lineKey={lineKey} />;
    case "choice":
      return <ChoiceRow line={line} lineKey={lineKey} />;
    case "derived":
      return <DerivedRow line={line} lineKey={lineKey} />;
    case "composition":
      return <CompositionTable lineKey={lineKey} />;
  }
}

const badMessage = (text: string | undefined): LineMessage | undefined => (text ? { tone: "bad", text } : undefined);

function TextRow({ line, lineKey }: { line: TextLine; lineKey: LineKey }) {
  const { draft, editable, errors, setLine } = useDraft();
  const value = draft.lines[lineKey];
  return (
    <Line
      no={lineKey}
      label={line.label}
      hint={line.hint}
      message={badMessage(errors[lineKey])}
      tone={editable ? "rest" : "locked"}
      wide
    >
      <TextField value={value?.typed ?? ""} maxLength={line.maxLength} onValueChange={(typed) => setLine(lineKey, { typed })} />
    </Line>
  );
}

function ChoiceRow({ line, lineKey }: { line: ChoiceLine; lineKey: LineKey }) {
  const { draft, editable, errors, setLine } = useDraft();
  const typed = draft.lines[lineKey]?.typed ?? "";
  const common = {
    no: lineKey,
    label: line.label,
    hint: line.hint,
    message: badMessage(errors[lineKey]),
    tone: editable ? ("rest" as const) : ("locked" as const),
    source: <RowSource line={line} lineKey={lineKey} />,
  };
  if (line.radios) {
    return (
      <Line {...common} group across>
        <RadioRow across value={typed} options={line.options} onValueChange={(chosen) => setLine(lineKey, { typed: chosen })} />
      </Line>
    );
  }
  return (
    <Line {...common}>
      <ChoiceField
        value={typed}
        options={line.options}
        prompt="Choose"
        readOnly={line.options.length === 1}
        onValueChange={(chosen) => setLine(lineKey, { typed: chosen })}
      />
    </Line>
  );
}

function DerivedRow({ line, lineKey }: { line: DerivedLine; lineKey: LineKey }) {
  const { draft } = useDraft();
  const { system } = useUnits();
  const found = derivedValue(draft, line);
  const unit = line.shown[system];
  return (
    <Line
      no={lineKey}
      label={line.label}
      tone="derived"
      source={
        <SourceField
          lineNo={lineKey}
          label={line.label}
          source={found ? { kind: "derived", note: found.from } : null}
          asksFor={false}
          editable={false}
          onChange={() => undefined}
        />
      }
    >
      <UnitField value={found ? formatForField(line.quantity, found.si, unit) : ""} unit={unit} readOnly placeholder="–" />
    </Line>
  );
}

/** The source of a line whose value is a choice: offered once it says something, never in the way. */
function RowSource({ line, lineKey }: { line: RegisteredLine; lineKey: LineKey }) {
  const { draft, editable, setLine } = useDraft();
  const value = draft.lines[lineKey];
  if (line.sourceFree) return null;
  return (
    <SourceField
      lineNo={lineKey}
      label={line.label}
      source={value?.source ?? null}
      asksFor={false}
      editable={editable && value?.source != null}
      onChange={(source) => setLine(lineKey, { source })}
    />
  );
}

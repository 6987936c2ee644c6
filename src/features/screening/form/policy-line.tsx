"use client";

import { useState } from "react";
import { Button } from "@/components/button/button";
import { Line } from "@/components/line/line";
import { UnitField } from "@/components/line/unit-field";
import { formatForField, withUnit } from "@/components/quantity/format";
import { useUnits } from "@/components/units/units-provider";
import type { LineKey, QuantityLine } from "@/contracts/lines/line";
import { againstPolicy, policyLimit } from "@/contracts/policy-limit";
import { useDraft } from "./draft-context";
import { QuantityRow } from "./quantity-row";

const standingWords = {
  same: "The same as the policy.",
  stricter: "Stricter than the policy: give the reason as its source.",
  looser: "Looser than the policy: the reason given as its source is shown to the approver.",
};

/** A limit: dashed with the policy's value until it is set here; then the policy's value is struck through and a source is due. */
export function PolicyLine({ line, lineKey }: { line: QuantityLine; lineKey: LineKey }) {
  const { draft, editable, setLine, subject } = useDraft();
  const { system } = useUnits();
  const [opened, setOpened] = useState(false);
  const { policy, barometricPressurePa } = subject.site;
  const given = policyLimit(line.no, subject.site) ?? null;

  const unit = line.shown[system];
  const text = given === null ? null : formatForField(line.quantity, given, unit, barometricPressurePa);
  const value = draft.lines[lineKey];
  const setHere = opened || Boolean(value && (value.typed.trim() !== "" || value.si !== null));
  const name = `${policy.name} rev ${policy.rev}`;
  const stands = typeof value?.si === "number" ? againstPolicy(line.no, value.si, subject.site) : undefined;

  if (setHere) {
    return (
      <div>
        <QuantityRow line={line} lineKey={lineKey} />
        <p className="border-b py-1 pl-[60px] text-small text-ink-3 phone:pl-12">
          {text === null ? (
            `${name} asks for none.`
          ) : (
            <>
              {name}: <s>{withUnit(text, unit)}</s>
              {stands && `. ${standingWords[stands]}`}
            </>
          )}{" "}
          {editable && (
            <Button
              kind="quiet"
              onClick={() => {
                setLine(lineKey, { typed: "", unit: null, si: null, source: null });
                setOpened(false);
              }}
            >
              {text === null ? "Ask for none" : "Take the policy value"}
            </Button>
          )}
        </p>
      </div>
    );
  }
  return (
    <Line
      no={lineKey}
      label={line.label}
      hint={line.hint}
      tone="derived"
      source={
        <span className="flex flex-wrap items-baseline gap-x-3">
          <span className="font-serif text-note text-ink-2">{given === null ? `${name} asks for none` : `Policy ${name}`}</span>
          {editable && (
            <Button kind="quiet" onClick={() => setOpened(true)}>
              {given === null ? "Ask for it" : "Set here"}
            </Button>
          )}
        </span>
      }
    >
      <UnitField value={text ?? "not asked for"} unit={text === null ? "" : unit} readOnly />
    </Line>
  );
}

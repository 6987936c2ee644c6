"use client";

import { useState } from "react";
import { ChoiceField } from "@/components/line/choice-field";
import { SourceButton, SourceNote } from "@/components/line/source-note";
import { TextField } from "@/components/line/text-field";
import { LineContext } from "@/components/line/line-context";
import { Button } from "@/components/button/button";
import { sourceKinds, type Source } from "@/contracts/draft";

const kindLabels: Record<Source["kind"], string> = {
  sheet: "Data sheet or document",
  measured: "Measured",
  derived: "Derived",
  assumed: "Assumed",
};

/**
 * Where a line's value comes from: what it is, and which. Opens in place; Alt+S at the line opens it too (the form's keys press this button).
 *
 * asksFor   the line has a value, so a missing source is said
 */
export function SourceField({
  lineNo,
  label,
  source,
  asksFor,
  editable,
  onChange,
}: {
  lineNo: string;
  label: string;
  source: Source | null;
  asksFor: boolean;
  editable: boolean;
  onChange: (source: Source | null) => void;
}) {
  const [open, setOpen] = useState(false);
  const missing = !source?.note.trim();

  if (!editable) return source ? <SourceNote kind={source.kind}>{source.note}</SourceNote> : null;
  if (!open) {
    if (missing && !asksFor) return null;
    return (
      <span data-source-of={lineNo}>
        <SourceButton
          kind={missing ? "missing" : (source?.kind ?? "missing")}
          label={`Source of ${label}`}
          expanded={false}
          onOpen={() => setOpen(true)}
        >
          {missing ? undefined : source?.note}
        </SourceButton>
      </span>
    );
  }

  const kind = source?.kind ?? "sheet";
  return (
    // Its own fields are no values of the line: Enter closes instead of moving on.
    <LineContext.Provider value={null}>
      <div className="grid gap-1 py-1" role="group" aria-label={`Source of ${label}`}>
        <ChoiceField
          label="Kind of source"
          value={kind}
          options={sourceKinds.map((value) => ({ value, label: kindLabels[value] }))}
          onValueChange={(value) =>
            onChange({ kind: sourceKinds.find((one) => one === value) ?? "sheet", note: source?.note ?? "" })
          }
        />
        <TextField
          label={kind === "assumed" ? "Reason for the assumption" : "Which one, and where in it"}
          placeholder={kind === "assumed" ? "why this may be assumed" : "DS-2101 rev C, line 22"}
          value={source?.note ?? ""}
          maxLength={300}
          autoFocus
          onValueChange={(note) => onChange({ kind, note })}
          onKeyDown={(event) => {
            if (event.key === "Enter" || event.key === "Escape") setOpen(false);
          }}
        />
        <span>
          <Button kind="quiet" onClick={() => setOpen(false)}>
            Done
          </Button>
        </span>
      </div>
    </LineContext.Provider>
  );
}

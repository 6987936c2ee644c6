"use client";

import { useState } from "react";
import { Button } from "@/components/button/button";
import { Dialog } from "@/components/dialog/dialog";
import { RadioRow } from "@/components/line/radio-row";
import { draftDifferences } from "@/contracts/draft-differences";
import type { LineKey } from "@/contracts/lines/line";
import { parseLineKey } from "@/contracts/lines/registry";
import { applyChoices, type Choice } from "./merge";
import type { Conflict } from "./use-keeper";

/** Two saves changed the same lines: each is shown both ways, and the person chooses. Nothing is overwritten before. */
export function ConflictDialog({
  conflict,
  onSettle,
}: {
  conflict: Conflict;
  onSettle: (document: Conflict["merge"]["merged"]) => void;
}) {
  const [choices, setChoices] = useState<Record<LineKey, Choice>>({});
  const { theirs, merge } = conflict;
  const differing = draftDifferences(merge.merged, theirs.document).filter(({ line }) => merge.conflicts.includes(line));
  const open = differing.filter(({ line }) => choices[line] === undefined);

  return (
    <Dialog
      open
      onClose={() => undefined}
      title={`Changed elsewhere: ${theirs.updatedBy} saved the same ${differing.length === 1 ? "line" : "lines"}`}
      actions={
        <Button
          kind="main"
          waitsFor={
            open.length > 0 ? `${open.length === 1 ? "One choice is" : `${open.length} choices are`} missing.` : undefined
          }
          onClick={() => onSettle(applyChoices(merge, theirs.document, choices))}
        >
          Keep these
        </Button>
      }
    >
      <p className="mb-3 font-serif text-prose text-ink-2">
        Another tab or person saved this draft after you opened it. Lines that only one of you changed are settled already. Choose
        for the rest.
      </p>
      {differing.map(({ line, before, after }) => (
        <div key={line} className="border-t py-2">
          <p className="text-small">
            <span className="line-no">{line}</span> {parseLineKey(line)?.line.label}
          </p>
          <RadioRow
            label={`Line ${line}`}
            value={choices[line] ?? ""}
            options={[
              { value: "mine", label: before, phrase: "yours, in this tab" },
              { value: "theirs", label: after, phrase: `saved by ${theirs.updatedBy}` },
            ]}
            onValueChange={(value) => setChoices((made) => ({ ...made, [line]: value === "theirs" ? "theirs" : "mine" }))}
          />
        </div>
      ))}
    </Dialog>
  );
}

"use client";

import { useState } from "react";
import { Button } from "@/components/button/button";
import { useUnits } from "@/components/units/units-provider";
import type { PathCase } from "@/engine/cases/path-case";
import type { ChangeAnswer } from "@/workers/fluid-asks";
import { changeText } from "./change-text";

type Props = { document: PathCase | undefined; change: ChangeAnswer | null; onClear: () => void };

/** The case as a file for the command line, the result as text to cite, and a clean sheet. */
export function ChangeActions({ document, change, onClear }: Props) {
  const { system } = useUnits();
  const [told, setTold] = useState("");

  const copy = async () => {
    if (!document || !change) return;
    const date = new Date().toLocaleDateString("en-GB", { day: "numeric", month: "long", year: "numeric" });
    try {
      await navigator.clipboard.writeText(changeText(document, change, { system, date }));
      setTold("Copied.");
    } catch {
      setTold("This browser does not let a page copy. Take the case file instead.");
    }
  };

  return (
    <>
      <span role="status" className="text-small text-ink-2">
        {told}
      </span>
      {document && change && (
        <>
          <Button onClick={() => void copy()}>Copy as text</Button>
          <Button onClick={() => save(document)}>Case file</Button>
        </>
      )}
      <Button kind="quiet" onClick={onClear}>
        Clear
      </Button>
    </>
  );
}

/** As `npm run -s ebbmark -- run` takes it. */
function save(document: PathCase): void {
  const address = URL.createObjectURL(new Blob([`${JSON.stringify(document, null, 2)}\n`], { type: "application/json" }));
  const link = window.document.createElement("a");
  link.href = address;
  link.download = "change-of-state.json";
  link.click();
  setTimeout(() => URL.revokeObjectURL(address), 10_000);
}

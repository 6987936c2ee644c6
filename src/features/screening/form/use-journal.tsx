"use client";

import { useEffect, useState, type ReactNode } from "react";
import { Button } from "@/components/button/button";
import { Notice } from "@/components/caution/notice";
import type { DraftDocument } from "@/contracts/draft";
import { draftDifferences } from "@/contracts/draft-differences";
import type { DraftView } from "@/contracts/views";
import { mergeDrafts } from "./merge";
import { readJournal, tearOut } from "./journal";

/**
 * Brings back what was typed in this browser and never reached the server: once, when the form opens. Lines that the server has by now in
 * other words stay as typed here and are kept by the next save; the notice names them all.
 */
export function useJournal(start: DraftView, replace: (document: DraftDocument) => void): ReactNode {
  const [found, setFound] = useState<{ lines: string[]; at: string } | null>(null);

  useEffect(() => {
    const page = start.editable ? readJournal(localStorage, start.screeningId, start.rev) : undefined;
    if (!page) return;
    const { merged } = mergeDrafts(page.base, page.document, start.document);
    const lines = draftDifferences(start.document, merged).map(({ line }) => line);
    if (lines.length === 0) {
      tearOut(localStorage, start.screeningId, start.rev);
      return;
    }
    replace(merged);
    // Storage is read after the first drawing on purpose: the server has none.
    // eslint-disable-next-line react-hooks/set-state-in-effect
    setFound({ lines, at: page.at });
    // Only what the form opened with counts.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, []);

  if (!found) return null;
  return (
    <div className="mx-auto max-w-sheet">
      <Notice tone="caution" title="Brought back from this browser.">
        {found.lines.length === 1 ? "Line" : "Lines"} {found.lines.join(", ")} had not reached the server when this page was last
        closed. They stand as you typed them and are being kept.{" "}
        <Button kind="quiet" onClick={() => setFound(null)}>
          Close this note
        </Button>
      </Notice>
    </div>
  );
}

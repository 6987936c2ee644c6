"use client";

import { useEffect, useState, type ReactNode } from "react";
import { Button } from "@/components/button/button";
import { Notice } from "@/components/caution/notice";
import { draftDifferences } from "@/contracts/draft-differences";
import type { DraftView } from "@/contracts/views";
import { bringBack, readJournal, tearOut, type FoundPage } from "./journal";
import { isAlive, keepAlive } from "./tab-alive";
import type { Keeper } from "./use-keeper";

/**
 * Brings back what was typed in this browser and never reached the server: once, when the form opens, from tabs that are gone. A line that
 * somebody else has saved differently meanwhile is put to choice; the rest is kept by the next save, and a notice names it.
 */
export function useJournal(start: DraftView, tab: string, adopt: Keeper["adopt"]): ReactNode {
  const [lines, setLines] = useState<string[] | null>(null);

  useEffect(() => {
    const ended = new AbortController();
    keepAlive(tab, ended.signal);
    void (async () => {
      if (!start.editable) return;
      const pages = await left(readJournal(localStorage, start), tab);
      if (ended.signal.aborted || pages.length === 0) return;
      const throwAway = () => pages.forEach((page) => tearOut(localStorage, start, page.tab));
      const merge = bringBack(pages, start.document);
      const brought = draftDifferences(start.document, merge.merged).map(({ line }) => line);
      if (brought.length === 0) return throwAway();
      adopt(merge, throwAway);
      setLines(brought);
    })();
    return () => ended.abort();
    // Only what the form opened with counts.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, []);

  if (!lines) return null;
  return (
    <div className="mx-auto max-w-sheet">
      <Notice tone="caution" title="Brought back from this browser.">
        {lines.length === 1 ? "Line" : "Lines"} {lines.join(", ")} had not reached the server when this page was last closed. They
        stand as you typed them and are being kept.{" "}
        <Button kind="quiet" onClick={() => setLines(null)}>
          Close this note
        </Button>
      </Notice>
    </div>
  );
}

/** Pages of tabs that are gone. */
async function left(pages: FoundPage[], own: string): Promise<FoundPage[]> {
  const gone = await Promise.all(pages.map(async ({ tab }) => tab === own || !(await isAlive(tab))));
  return pages.filter((_, at) => gone[at]);
}

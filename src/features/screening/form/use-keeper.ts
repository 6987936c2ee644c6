"use client";

import { useCallback, useEffect, useRef, useState } from "react";
import type { Keeping } from "@/components/parts/kept-word";
import { formatClock } from "@/components/quantity/format-time";
import type { DraftDocument } from "@/contracts/draft";
import { endpoints } from "@/contracts/paths";
import type { DraftView } from "@/contracts/views";
import { fetchJson } from "@/features/query/fetch-json";
import { isRefused, RefusedError, UnreachableError, wordsOf } from "@/features/query/refused-error";
import { mergeDrafts, type Merge } from "./merge";
import { tearOut, writeJournal } from "./journal";

const restMs = 600;
const retryMs = [2_000, 4_000, 8_000, 15_000, 30_000];

export type Conflict = { theirs: DraftView; merge: Merge };
export type Kept = { version: number; document: DraftDocument };

export type Keeper = {
  keeping: Keeping;
  /** What stands in the way of keeping, in words; nothing is lost meanwhile. */
  trouble: string | null;
  conflict: Conflict | null;
  /** Lines taken over from another save, to be told. */
  taken: { by: string; lines: string[] } | null;
  /** What the server holds. */
  kept: Kept;
  /** Keeps now what has not been kept; answers with the version, or null while it can't be kept. */
  flush: () => Promise<number | null>;
  settle: (document: DraftDocument) => void;
  forgetTaken: () => void;
};

/**
 * Keeps the draft on the server while it is typed: after a rest, on leaving the page, again after a failure. Saves go one after another and
 * each names the version it was typed on, so a second tab or person is never overwritten: what both changed becomes a conflict.
 *
 * document      as it stands
 * start         as the server gave it
 * replace       puts a merged draft into the form
 */
export function useKeeper(document: DraftDocument, start: DraftView, replace: (document: DraftDocument) => void): Keeper {
  const { screeningId, rev } = start;
  const [keeping, setKeeping] = useState<Keeping>({ state: "untouched" });
  const [trouble, setTrouble] = useState<string | null>(null);
  const [conflict, setConflict] = useState<Conflict | null>(null);
  const [taken, setTaken] = useState<Keeper["taken"]>(null);
  const [kept, setKept] = useState<Kept>({ version: start.version, document: start.document });

  const now = useRef(document);
  const held = useRef(kept);
  const stopped = useRef(false);
  const running = useRef<Promise<number | null> | null>(null);
  const failures = useRef(0);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);

  useEffect(() => {
    now.current = document;
  }, [document]);

  // The reader's own clock is known in the browser only, so the time is written after the first drawing.
  useEffect(() => {
    // eslint-disable-next-line react-hooks/set-state-in-effect
    setKeeping((first) => (first.state === "untouched" ? { state: "kept", at: formatClock(new Date(start.updatedAt)) } : first));
  }, [start.updatedAt]);

  const changed = useCallback(() => JSON.stringify(now.current) !== JSON.stringify(held.current.document), []);

  const took = useCallback((view: DraftView, sent: DraftDocument) => {
    // The server derives SI values again; the form keeps its own text, so only what was sent counts as kept.
    held.current = { version: view.version, document: sent };
    setKept(held.current);
    failures.current = 0;
    setTrouble(null);
    setKeeping({ state: "kept", at: formatClock(new Date(view.updatedAt)) });
  }, []);

  const meet = useCallback(
    (theirs: DraftView) => {
      const merge = mergeDrafts(held.current.document, now.current, theirs.document);
      held.current = { version: theirs.version, document: theirs.document };
      setKept(held.current);
      if (merge.taken.length > 0) setTaken({ by: theirs.updatedBy, lines: merge.taken });
      now.current = merge.merged;
      replace(merge.merged);
      if (merge.conflicts.length === 0) return;
      stopped.current = true;
      setConflict({ theirs, merge });
      setKeeping({ state: "conflict" });
    },
    [replace],
  );

  const save = useCallback(async (): Promise<number | null> => {
    if (stopped.current) return null;
    if (!changed()) return held.current.version;
    const sent = now.current;
    setKeeping({ state: "keeping" });
    try {
      const view = await fetchJson<DraftView>(endpoints.draft(screeningId), {
        method: "PUT",
        body: { baseVersion: held.current.version, document: sent },
      });
      took(view, sent);
      if (!changed()) tearOut(localStorage, screeningId, rev);
      return view.version;
    } catch (error) {
      if (isRefused(error, "draft-changed")) {
        const theirs = (error.problem as RefusedError["problem"] & { current?: DraftView }).current;
        if (theirs) {
          meet(theirs);
          return null;
        }
      }
      failures.current += 1;
      setTrouble(
        error instanceof UnreachableError
          ? "The server can't be reached. What you type is kept in this browser and sent when it answers."
          : wordsOf(error),
      );
      setKeeping((before) => (before.state === "not-kept" ? before : { state: "not-kept", since: formatClock(new Date()) }));
      return null;
    }
  }, [screeningId, rev, took, meet, changed]);

  /** One save at a time; a change during a save is kept by the next round, a failed save is tried again later. */
  const flush = useCallback(async (): Promise<number | null> => {
    const again = (afterMs: number) => {
      timer.current = setTimeout(() => void round(), afterMs);
    };
    const round = async (): Promise<number | null> => {
      clearTimeout(timer.current);
      while (running.current) await running.current;
      running.current = save().finally(() => {
        running.current = null;
      });
      const version = await running.current;
      if (!changed() || stopped.current) return version;
      if (version !== null) return round();
      again(failures.current === 0 ? 50 : (retryMs[Math.min(failures.current, retryMs.length) - 1] ?? 30_000));
      return null;
    };
    return round();
  }, [save, changed]);

  useEffect(() => {
    if (JSON.stringify(document) === JSON.stringify(held.current.document)) return;
    writeJournal(localStorage, screeningId, rev, {
      baseVersion: held.current.version,
      base: held.current.document,
      document,
      at: new Date().toISOString(),
    });
    clearTimeout(timer.current);
    timer.current = setTimeout(() => void flush(), restMs);
  }, [document, flush, screeningId, rev]);

  useEffect(() => {
    const leave = () => {
      if (stopped.current || !changed()) return;
      void fetch(endpoints.draft(screeningId), {
        method: "PUT",
        headers: { "content-type": "application/json" },
        body: JSON.stringify({ baseVersion: held.current.version, document: now.current }),
        keepalive: true,
      });
    };
    const online = () => void flush();
    window.addEventListener("pagehide", leave);
    window.addEventListener("online", online);
    return () => {
      window.removeEventListener("pagehide", leave);
      window.removeEventListener("online", online);
      clearTimeout(timer.current);
      if (!stopped.current && changed()) void flush();
    };
  }, [flush, changed, screeningId]);

  const settle = useCallback(
    (settled: DraftDocument) => {
      stopped.current = false;
      setConflict(null);
      now.current = settled;
      replace(settled);
      void flush();
    },
    [flush, replace],
  );

  return { keeping, trouble, conflict, taken, kept, flush, settle, forgetTaken: () => setTaken(null) };
}

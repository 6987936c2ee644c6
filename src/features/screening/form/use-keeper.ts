"use client";

import { useCallback, useEffect, useRef, useState } from "react";
import type { Keeping } from "@/components/parts/kept-word";
import { formatClock } from "@/components/quantity/format-time";
import type { DraftDocument } from "@/contracts/draft";
import { endpoints } from "@/contracts/paths";
import type { DraftView } from "@/contracts/views";
import { fetchJson } from "@/features/query/fetch-json";
import { isRefused, RefusedError, UnreachableError, wordsOf } from "@/features/query/refused-error";
import { mergeDrafts, same, type Merge } from "./merge";
import { tearOut, writeJournal } from "./journal";

const restMs = 600;
/** A connection may drop after the save and before its answer, several times over. */
const rememberedSends = 4;
const retryMs = [2_000, 4_000, 8_000, 15_000, 30_000];

const inJournal = "What you type is kept in this browser and sent when it answers.";
const onlyHere = "This browser has no room to keep what you type: leave this page open until it is sent.";

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
  /** Takes lines that this browser still had; `written` is called once they are safe elsewhere. */
  adopt: (merge: Merge, written: () => void) => void;
  forgetTaken: () => void;
};

/**
 * Keeps the draft on the server while it is typed: after a rest, on leaving the page, again after a failure. Saves go one after another and
 * each names the version it was typed on, so a second tab or person is never overwritten: what both changed becomes a conflict.
 *
 * document      as it stands
 * start         as the server gave it
 * tab           names this tab's page in the journal
 * replace       puts a merged draft into the form
 */
export function useKeeper(
  document: DraftDocument,
  start: DraftView,
  tab: string,
  replace: (document: DraftDocument) => void,
): Keeper {
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
  const unanswered = useRef<readonly DraftDocument[]>([]);
  const failures = useRef(0);
  const journalHolds = useRef(true);
  const afterChoice = useRef<() => void>(undefined);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);

  useEffect(() => {
    now.current = document;
  }, [document]);

  // The reader's own clock is known in the browser only, so the time is written after the first drawing.
  useEffect(() => {
    // eslint-disable-next-line react-hooks/set-state-in-effect
    setKeeping((first) => (first.state === "untouched" ? { state: "kept", at: formatClock(new Date(start.updatedAt)) } : first));
  }, [start.updatedAt]);

  const changed = useCallback(() => !same(now.current, held.current.document), []);

  /** Writes this tab's page anew, or tears it out once the server has everything. */
  const note = useCallback(() => {
    const of = { screeningId, rev };
    if (!changed()) return tearOut(localStorage, of, tab);
    journalHolds.current = writeJournal(localStorage, of, tab, {
      baseVersion: held.current.version,
      base: held.current.document,
      document: now.current,
      sent: [...unanswered.current],
      at: new Date().toISOString(),
    });
  }, [screeningId, rev, tab, changed]);

  const took = useCallback(
    (view: DraftView, document: DraftDocument) => {
      // The server derives SI values again; the form keeps its own text, so only what was sent counts as kept.
      held.current = { version: view.version, document };
      unanswered.current = [];
      setKept(held.current);
      failures.current = 0;
      setTrouble(null);
      setKeeping({ state: "kept", at: formatClock(new Date(view.updatedAt)) });
      note();
    },
    [note],
  );

  /** Nothing more is saved, and the journal keeps what it was before, until the person has chosen. */
  const putToChoice = useCallback((theirs: DraftView, merge: Merge) => {
    stopped.current = true;
    setConflict({ theirs, merge });
    setKeeping({ state: "conflict" });
  }, []);

  const meet = useCallback(
    (theirs: DraftView) => {
      const merge = mergeDrafts(held.current.document, now.current, theirs.document, unanswered.current);
      held.current = { version: theirs.version, document: theirs.document };
      setKept(held.current);
      if (merge.taken.length > 0) setTaken({ by: theirs.updatedBy, lines: merge.taken });
      now.current = merge.merged;
      replace(merge.merged);
      if (merge.conflicts.length > 0) putToChoice(theirs, merge);
      else note();
    },
    [replace, putToChoice, note],
  );

  const save = useCallback(async (): Promise<number | null> => {
    if (stopped.current) return null;
    if (!changed()) {
      // The choice may have been for what the server holds already: then all is kept, and said so.
      setKeeping((before) => (before.state === "conflict" ? { state: "kept", at: formatClock(new Date()) } : before));
      return held.current.version;
    }
    const document = now.current;
    unanswered.current = [...unanswered.current, document].slice(-rememberedSends);
    note();
    // "Not kept since" stands until something is kept: trying again is no news.
    setKeeping((before) => (before.state === "not-kept" ? before : { state: "keeping" }));
    try {
      const view = await fetchJson<DraftView>(endpoints.draft(screeningId), {
        method: "PUT",
        body: { baseVersion: held.current.version, document },
      });
      took(view, document);
      return view.version;
    } catch (error) {
      // A refusal is an answer: these words did not arrive. Those before may have.
      if (error instanceof RefusedError) unanswered.current = unanswered.current.filter((one) => one !== document);
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
          ? `The server can't be reached. ${journalHolds.current ? inJournal : onlyHere}`
          : wordsOf(error),
      );
      setKeeping((before) => (before.state === "not-kept" ? before : { state: "not-kept", since: formatClock(new Date()) }));
      return null;
    }
  }, [screeningId, took, meet, changed, note]);

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
    if (stopped.current) return;
    note();
    if (!changed()) return;
    clearTimeout(timer.current);
    timer.current = setTimeout(() => void flush(), restMs);
  }, [document, flush, note, changed]);

  const newestFlush = useRef(flush);
  useEffect(() => {
    newestFlush.current = flush;
  }, [flush]);

  // Once for the life of the form, so that only its true end counts as leaving.
  useEffect(() => {
    const keepNow = () => {
      if (!stopped.current && changed()) void newestFlush.current();
    };
    const leave = () => {
      if (stopped.current || !changed()) return;
      void fetch(endpoints.draft(screeningId), {
        method: "PUT",
        headers: { "content-type": "application/json" },
        body: JSON.stringify({ baseVersion: held.current.version, document: now.current }),
        keepalive: true,
      }).catch(() => undefined); // the journal has it
    };
    // Leaving a line keeps it at once: after the field's own work on leaving, which may move a typed unit.
    const leftLine = () => setTimeout(keepNow, 0);
    const hidden = () => window.document.visibilityState === "hidden" && keepNow();
    window.addEventListener("pagehide", leave);
    window.addEventListener("online", keepNow);
    window.addEventListener("focusout", leftLine);
    window.document.addEventListener("visibilitychange", hidden);
    return () => {
      window.removeEventListener("pagehide", leave);
      window.removeEventListener("online", keepNow);
      window.removeEventListener("focusout", leftLine);
      window.document.removeEventListener("visibilitychange", hidden);
      clearTimeout(timer.current);
      keepNow();
    };
  }, [changed, screeningId]);

  const settle = useCallback(
    (settled: DraftDocument) => {
      stopped.current = false;
      setConflict(null);
      now.current = settled;
      replace(settled);
      note();
      afterChoice.current?.();
      afterChoice.current = undefined;
      void flush();
    },
    [flush, replace, note],
  );

  const adopt = useCallback(
    (merge: Merge, written: () => void) => {
      // What was typed while the journal was read stays too.
      now.current = mergeDrafts(held.current.document, merge.merged, now.current).merged;
      replace(now.current);
      if (merge.conflicts.length > 0) {
        afterChoice.current = written;
        return putToChoice(start, { ...merge, merged: now.current });
      }
      note();
      written();
    },
    [replace, note, putToChoice, start],
  );

  return { keeping, trouble, conflict, taken, kept, flush, settle, adopt, forgetTaken: () => setTaken(null) };
}

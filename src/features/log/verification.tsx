"use client";

import { createContext, useCallback, useContext, useEffect, useMemo, useRef, useState, type ReactNode } from "react";
import type { Seal } from "@/components/log/seal-word";
import { wordsOf } from "@/features/query/refused-error";
import type { EntryVerdict } from "@/ledger/verify-ledger";
import { verifyLog, type LogVerdict, type Progress } from "./verify-log";

export type Check =
  | { state: "idle" }
  | { state: "running"; progress: Progress }
  | { state: "cancelled"; progress: Progress }
  | { state: "failed"; words: string }
  | { state: "done"; verdict: LogVerdict; at: Date };

type Verification = {
  check: Check;
  verify: () => void;
  cancel: () => void;
  /** What the check found of one entry; undefined while nobody has looked. */
  verdictOf: (seq: number) => EntryVerdict | undefined;
};

const VerificationContext = createContext<Verification | null>(null);
const none: Progress = { checked: 0, of: 0, verdicts: [] };

/** Holds what this browser has recomputed, for the list and for the entry beside it. */
export function VerificationProvider({ children }: { children: ReactNode }) {
  const [check, setCheck] = useState<Check>({ state: "idle" });
  const running = useRef<AbortController | null>(null);
  useEffect(() => () => running.current?.abort(), []);

  const verify = useCallback(() => {
    running.current?.abort();
    const controller = new AbortController();
    running.current = controller;
    let progress = none;
    setCheck({ state: "running", progress });
    // What an older check still has to say is not heard any more.
    const say = (next: Check) => running.current === controller && setCheck(next);
    verifyLog((now) => {
      progress = now;
      say({ state: "running", progress });
    }, controller.signal).then(
      (verdict) => say({ state: "done", verdict, at: new Date() }),
      (error: unknown) =>
        say(controller.signal.aborted ? { state: "cancelled", progress } : { state: "failed", words: wordsOf(error) }),
    );
  }, []);
  const cancel = useCallback(() => running.current?.abort(), []);

  const bySeq = useMemo(() => new Map(verdictsOf(check).map((verdict) => [verdict.seq, verdict])), [check]);
  const verdictOf = useCallback((seq: number) => bySeq.get(seq), [bySeq]);
  const value = useMemo(() => ({ check, verify, cancel, verdictOf }), [check, verify, cancel, verdictOf]);
  return <VerificationContext.Provider value={value}>{children}</VerificationContext.Provider>;
}

export function useVerification(): Verification {
  const found = useContext(VerificationContext);
  if (!found) throw new Error("useVerification needs a VerificationProvider around it");
  return found;
}

export const sealOf = (verdict: EntryVerdict | undefined): Seal =>
  verdict === undefined ? "not-checked" : verdict.holds ? "holds" : "broken";

const verdictsOf = (check: Check): EntryVerdict[] =>
  check.state === "done"
    ? check.verdict.verdicts
    : check.state === "running" || check.state === "cancelled"
      ? check.progress.verdicts
      : [];

"use client";

import Link from "next/link";
import { useRouter } from "next/navigation";
import { useRef, useState } from "react";
import { Button } from "@/components/button/button";
import { Notice } from "@/components/caution/notice";
import { endpoints, pages } from "@/contracts/paths";
import type { PreparedView } from "@/contracts/views";
import { fetchJson } from "@/features/query/fetch-json";
import { RefusedError, wordsOf } from "@/features/query/refused-error";
import { useDraft } from "./draft-context";
import { lineAddress } from "./line-address";
import { firstInTheWay } from "./part-status";

/** Runs the case on the server, twice, and goes to its sheet. Says which line it waits for; can be cancelled while it runs. */
export function ComputeButton({ main }: { main: boolean }) {
  const { cases, keeper, subject, editable } = useDraft();
  const router = useRouter();
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<{ words: string; lines: { path: string; message: string }[] } | null>(null);
  const abort = useRef<AbortController>(undefined);
  const waits = firstInTheWay(cases);

  async function compute() {
    setBusy(true);
    setProblem(null);
    abort.current = new AbortController();
    try {
      const version = await keeper.flush();
      if (version === null) {
        setProblem({ words: "The lines are not kept by the server yet. Compute again when they are.", lines: [] });
        return;
      }
      await fetchJson<PreparedView>(endpoints.compute(subject.screeningId), {
        method: "POST",
        body: { draftVersion: version },
        signal: abort.current.signal,
      });
      router.push(pages.screening(subject.screeningId));
    } catch (error) {
      if (error instanceof DOMException) return;
      setProblem({ words: wordsOf(error), lines: error instanceof RefusedError ? (error.problem.problems ?? []) : [] });
    } finally {
      setBusy(false);
    }
  }

  if (!editable) return null;
  return (
    <>
      <Button
        kind={main ? "main" : "plain"}
        busy={busy}
        waitsFor={
          waits ? (
            <>
              Waits for <Link href={lineAddress(subject.screeningId, waits)}>line {waits}</Link>
            </>
          ) : undefined
        }
        onClick={compute}
      >
        {busy ? "Computing twice, the second time tenfold tighter…" : "Compute in full"}
      </Button>
      {busy && (
        <Button kind="quiet" onClick={() => abort.current?.abort()}>
          Cancel
        </Button>
      )}
      {problem && (
        <div className="w-full">
          <Notice tone="error" title="Not computed.">
            {problem.words}
            {problem.lines.map(({ path, message }) => (
              <span key={path} className="block">
                <Link href={lineAddress(subject.screeningId, path)}>{path}</Link> {message}
              </span>
            ))}
          </Notice>
        </div>
      )}
    </>
  );
}

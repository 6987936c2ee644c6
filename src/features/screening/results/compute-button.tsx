"use client";

import { useMutation } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { Button } from "@/components/button/button";
import { Notice } from "@/components/caution/notice";
import { endpoints } from "@/contracts/paths";
import type { DraftView, PreparedView } from "@/contracts/views";
import { postJson } from "@/features/query/fetch-json";
import { isRefused, wordsOf } from "@/features/query/refused-error";
import { LineLink } from "./line-link";

/**
 * Computes the draft in full on the server and draws the sheet anew.
 *
 * children   "Compute again", "Compute in full"
 */
export function ComputeButton({
  draft,
  kind = "plain",
  children,
}: {
  draft: DraftView;
  kind?: "main" | "plain";
  children: string;
}) {
  const router = useRouter();
  const compute = useMutation({
    mutationFn: () => postJson<PreparedView>(endpoints.compute(draft.screeningId), { draftVersion: draft.version }),
    onSuccess: () => router.refresh(),
  });
  const problems = isRefused(compute.error, "invalid-request") ? (compute.error.problem.problems ?? []) : [];
  return (
    <>
      <Button kind={kind} busy={compute.isPending} onClick={() => compute.mutate()}>
        {compute.isPending ? "Computing…" : children}
      </Button>
      {compute.isPending && (
        <span role="status" className="text-small text-ink-2">
          Two runs, the second ten times tighter.
        </span>
      )}
      {compute.isError && (
        <div className="basis-full">
          <Notice tone="error" title="Not computed.">
            {wordsOf(compute.error)}
            {problems.length > 0 && (
              <ul className="pt-1">
                {problems.map(({ path, message }) => (
                  <li key={path}>
                    <LineLink line={path} edits={draft.screeningId} /> {message}
                  </li>
                ))}
              </ul>
            )}
          </Notice>
        </div>
      )}
    </>
  );
}

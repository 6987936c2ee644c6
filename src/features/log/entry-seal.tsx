"use client";

import { useMutation } from "@tanstack/react-query";
import { Button } from "@/components/button/button";
import { Notice } from "@/components/caution/notice";
import { SealWord } from "@/components/log/seal-word";
import { formatClock } from "@/components/quantity/format-time";
import { wordsOf } from "@/features/query/refused-error";
import { sealOf, useVerification } from "./verification";
import { verifyOne, type OneVerdict } from "./verify-log";

/** What this browser found of one entry, and the button that looks again. */
export function EntrySeal({ seq }: { seq: number }) {
  const { verdictOf } = useVerification();
  const one = useMutation({ mutationFn: async () => ({ verdict: await verifyOne(seq), at: new Date() }) });
  const whole = verdictOf(seq);
  const verdict = one.data?.verdict ?? whole;
  const words = one.data
    ? oneWords(one.data.verdict, one.data.at)
    : whole && (whole.holds ? "Seal holds, in the check of the whole log" : "Seal broken");

  return (
    <>
      <div role="status" className="mt-3 border-b-3 border-t border-double border-ink py-3 [border-top-style:solid]">
        <p className="font-semibold">
          <SealWord seal={sealOf(verdict)}>{words || "Not checked in this browser yet"}</SealWord>
        </p>
        {verdict && !verdict.holds && (
          <ul className="pt-1 font-serif text-prose text-beyond">
            {verdict.faults.map((fault) => (
              <li key={fault}>{fault}</li>
            ))}
          </ul>
        )}
        {one.data?.verdict.withheld && (
          <p className="pt-1 text-small text-ink-2">
            Its body is not open to your role: chain and envelope are checked, the content is not.
          </p>
        )}
      </div>
      {one.isError && (
        <div className="mt-3">
          <Notice tone="error">{wordsOf(one.error)} The entry was not checked.</Notice>
        </div>
      )}
      <div className="mt-3.5">
        <Button kind="main" busy={one.isPending} onClick={() => one.mutate()}>
          {one.data ? "Verify again" : "Verify this entry"}
        </Button>
      </div>
      <p className="pt-2 font-serif text-note text-ink-2">
        Recomputes the seal from the entry’s own text and from the entry before it. “Verify all” goes back to the first.
      </p>
    </>
  );
}

const oneWords = ({ holds }: OneVerdict, at: Date): string =>
  `${holds ? "Seal holds" : "Seal broken"}, recomputed in your browser at ${formatClock(at)}`;

"use client";

import { useEffect } from "react";
import { Button } from "@/components/button/button";
import { Notice } from "@/components/caution/notice";
import { SealWord } from "@/components/log/seal-word";
import { formatClock } from "@/components/quantity/format-time";
import { Digest } from "@/components/sign/sign-panel";
import { Stop } from "@/components/states/stop";
import Link from "next/link";
import { pages } from "@/contracts/paths";
import { useVerification } from "./verification";

/**
 * The check of the whole log, in this browser: starts, shows how far it is, can be cancelled, says what it found.
 *
 * size    entries the log has, for the button
 * start   begins at once
 */
export function VerifyPanel({ size, start = false }: { size: number; start?: boolean }) {
  const { check, verify, cancel } = useVerification();
  useEffect(() => {
    if (start) verify();
  }, [start, verify]);

  return (
    <section aria-label="Check of the whole log" className="mb-3.5 grid gap-2">
      <div className="flex flex-wrap items-center gap-3">
        <Button kind="main" busy={check.state === "running"} onClick={verify}>
          {check.state === "idle" ? `Verify ${size === 1 ? "1 entry" : `all ${size} entries`}` : "Verify again"}
        </Button>
        {check.state === "running" && (
          <>
            <Button kind="quiet" onClick={cancel}>
              Cancel
            </Button>
            <progress
              className="h-2.5 w-40 accent-[var(--tide)]"
              max={check.progress.of || 1}
              value={check.progress.checked}
              aria-label="Entries checked"
            />
            <span className="text-small text-ink-2" role="status">
              {check.progress.checked} of {check.progress.of || size} checked
            </span>
          </>
        )}
        {check.state === "cancelled" && (
          <span role="status" className="text-small text-ink-2">
            Cancelled. {check.progress.checked} entries were checked; nothing is said of the rest.
          </span>
        )}
      </div>
      {check.state === "failed" && (
        <Notice tone="error" title="The check did not come to an end.">
          {check.words} Nothing is said of the log.
        </Notice>
      )}
      {check.state === "done" && <Found />}
    </section>
  );
}

function Found() {
  const { check } = useVerification();
  if (check.state !== "done") return null;
  const { verdict, at } = check;
  const withheld =
    verdict.withheld > 0 &&
    `${verdict.withheld === 1 ? "1 body is" : `${verdict.withheld} bodies are`} not open to your role: chain and envelope are checked, the content is not.`;
  if (verdict.holds) {
    return (
      <div role="status" className="border-b-3 border-t border-double border-ink py-3 [border-top-style:solid]">
        <p className="font-semibold">
          <SealWord seal="holds">{`Every seal holds to entry ${verdict.size}, recomputed in your browser at ${formatClock(at)}`}</SealWord>
        </p>
        {withheld && <p className="pt-1 text-small text-ink-2">{withheld}</p>}
        <p className="pt-1 text-small text-ink-3">
          Head <Digest hex={verdict.head} short />. Compare it with the head on a printed record to see that nothing was cut off
          or rewritten.
        </p>
      </div>
    );
  }
  const first = verdict.broken[0];
  return (
    <div role="alert" className="border-b-3 border-t-2 border-double border-beyond py-1 [border-top-style:solid]">
      <Stop
        serious
        title={first ? `The seal of entry ${first.seq} does not hold` : "The log as a whole does not hold"}
        action={first && <Link href={pages.entry(first.seq)}>Open entry {first.seq}</Link>}
      >
        {verdict.brokenCount > 1 && <p>{verdict.brokenCount} entries do not hold.</p>}
        <ul>
          {verdict.faults.map((fault) => (
            <li key={fault}>{fault}</li>
          ))}
          {verdict.broken.slice(0, 20).map(({ seq, faults }) => (
            <li key={seq}>
              Entry {seq}: {faults.join(" ")}
            </li>
          ))}
        </ul>
        {verdict.brokenCount > 20 && <p>The first twenty are listed.</p>}
        {withheld && <p>{withheld}</p>}
      </Stop>
    </div>
  );
}

"use client";

import Link from "next/link";
import type { ReactNode } from "react";
import { MarginHead, MarginNote } from "@/components/shell/margin";
import { SheetWithMargin } from "@/components/shell/sheet";
import { caseKindWords, type CaseKind } from "@/contracts/draft";
import type { CaseRunView } from "@/contracts/views";
import { PercentileStudyPanel } from "./percentile-study";
import { SpreadStudyPanel } from "./spread-study";
import { TornadoStudyPanel } from "./tornado-study";

/**
 * How sure the figures of a computed case are: under other equations, with one input moved, with all of them drawn together. Run in this browser
 * from the stored case; nothing of it is stored.
 *
 * cases   to choose from, each with its address
 */
export function StudiesSheet({
  run,
  cases,
  titleBlock,
  back,
}: {
  run: CaseRunView;
  cases: readonly { letter: string; kind: CaseKind; href: string }[];
  titleBlock: ReactNode;
  back: ReactNode;
}) {
  const { cautions, cautionIds } = run.result;
  return (
    <SheetWithMargin
      titleBlock={titleBlock}
      margin={
        <>
          <MarginHead>Cautions</MarginHead>
          {cautions.map((words, i) => (
            <MarginNote key={words} no={cautionIds[i]} caution>
              {words}
            </MarginNote>
          ))}
        </>
      }
    >
      <h1 className="pb-2">How sure it is{cases.length > 1 && `, case ${run.letter}`}</h1>
      {cases.length > 1 && (
        <nav aria-label="Cases" className="flex flex-wrap gap-x-5 pb-4">
          {cases.map(({ letter, kind, href }) => (
            <Link
              key={letter}
              href={href}
              aria-current={letter === run.letter ? "true" : undefined}
              className="aria-[current]:font-semibold"
            >
              {letter} {caseKindWords[kind]}
            </Link>
          ))}
        </nav>
      )}
      <div key={run.letter}>
        <SpreadStudyPanel run={run} />
        <TornadoStudyPanel run={run} />
        <PercentileStudyPanel run={run} />
      </div>
      {back}
    </SheetWithMargin>
  );
}

"use client";

import Link from "next/link";
import { formatNumber } from "@/components/quantity/format";
import { EmptyAxes } from "@/components/states/empty-axes";
import { lineKeyOfPath } from "@/contracts/draft-back-links";
import { useDraft } from "../form/draft-context";
import { lineAddress } from "../form/line-address";
import { useForerunState } from "./forerun-context";
import { ForerunCurves } from "./forerun-curves";
import { ForerunFigures } from "./forerun-figures";

/** Live coarse run of the lines as they stand, beside the form. Never stored, never signed. */
export function Forerun() {
  const { made, letter, cases, subject } = useDraft();
  const { result, document, before, running, problem, problemPath, seconds } = useForerunState();
  const inTheWay = [...made.problems.map(({ line }) => line), ...made.missing];
  const first = inTheWay[0];
  const cited = problemPath === null ? undefined : lineKeyOfPath(problemPath, letter);
  const stale = result !== null && (first !== undefined || problem !== null);

  return (
    <>
      <div className="mb-1 flex flex-wrap items-baseline justify-between gap-x-3">
        <h2 className="text-sub">Forerun</h2>
        <span className="text-small text-ink-3">
          {cases.length > 1 && `case ${letter}, `}
          {running
            ? "running…"
            : seconds === null
              ? "coarse run, not for signing"
              : `coarse run, ${formatNumber(seconds, { decimals: 1 })} s, not for signing`}
        </span>
      </div>
      {first !== undefined && (
        <p className="border-t py-2 font-serif text-note text-ink-2">
          {result ? "These curves belong to the lines before. " : "Forerun starts when parts 2 to 5 have their first values. "}
          {made.problems.length > 0 ? (
            <Link href={lineAddress(subject.screeningId, first)}>Line {first} is to fix</Link>
          ) : (
            <>
              {inTheWay.length} {inTheWay.length === 1 ? "line is" : "lines are"} missing:{" "}
              <Link href={lineAddress(subject.screeningId, first)}>go to line {first}</Link>
            </>
          )}
          .
        </p>
      )}
      {first === undefined && problem && (
        <p role="status" className="border-t py-2 font-serif text-note text-beyond">
          {cited && (
            <>
              <Link href={lineAddress(subject.screeningId, cited)}>Line {cited}</Link>{" "}
            </>
          )}
          {problem}
        </p>
      )}
      {result && document ? (
        <>
          <ForerunCurves result={result} document={document} before={before} stale={stale} />
          <ForerunFigures result={result} document={document} before={before} stale={stale} />
        </>
      ) : (
        <EmptyAxes />
      )}
    </>
  );
}

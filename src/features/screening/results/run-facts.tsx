"use client";

import { formatNumber } from "@/components/quantity/format";
import { formatUtc } from "@/components/quantity/format-time";
import { Power, useShown } from "@/components/quantity/quantity";
import { MarginHead, MarginNote } from "@/components/shell/margin";
import { Digest } from "@/components/sign/sign-panel";
import type { PreparedView } from "@/contracts/views";
import { endingWords } from "./run-events";

/** How the figures were computed, and the names of the stored bytes. */
export function RunFacts({ prepared }: { prepared: PreparedView }) {
  const shown = useShown();
  return (
    <>
      <MarginHead>Run</MarginHead>
      {prepared.runs.map(({ letter, result: { summary, numerics } }) => (
        <MarginNote key={letter} no={prepared.runs.length > 1 ? `Case ${letter}` : undefined}>
          {shown("time", summary.endTimeS, { unit: { SI: "s", US: "s" } }).text} integrated in{" "}
          {formatNumber(numerics.steps, { decimals: 0 })} steps and {formatNumber(numerics.evaluations, { decimals: 0 })}{" "}
          evaluations, relative tolerance <Power value={numerics.relativeTolerance} figures={1} />. Energy, counted again from the
          states, closes to <Closure value={Math.max(summary.energyClosure, summary.energyClosureRecounted ?? 0)} />.{" "}
          {endingWords[summary.endedBy]}
        </MarginNote>
      ))}
      <MarginNote no="Engine">{prepared.content.engineVersion}</MarginNote>
      <MarginNote no="Computed">{formatUtc(prepared.computedAt)} UTC</MarginNote>
      <MarginNote no="Content">
        <Digest hex={prepared.contentSha256} />
      </MarginNote>
      {prepared.content.cases.map(({ letter, caseSha256, resultSha256 }) => (
        <MarginNote key={letter} no={`Case ${letter}`}>
          <Digest hex={caseSha256} short />, result <Digest hex={resultSha256} short />
        </MarginNote>
      ))}
    </>
  );
}

const Closure = ({ value }: { value: number }) => (value === 0 ? <>0</> : <Power value={value} figures={1} />);

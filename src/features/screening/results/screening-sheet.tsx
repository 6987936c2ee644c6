import type { ReactNode } from "react";
import { SitePressure } from "@/components/units/units-provider";
import { SheetWithMargin } from "@/components/shell/sheet";
import { caseKindWords } from "@/contracts/draft";
import type { PreparedView, ScreeningView } from "@/contracts/views";
import { AfterBlowdown } from "./after-blowdown";
import { AssumedMargin } from "./assumed-margin";
import { Charts } from "./charts";
import { EnergyLedger } from "./energy-ledger";
import { Inputs } from "./inputs";
import { Limits } from "./limits";
import { NotComputed } from "./not-computed";
import { RecordTitleBlock } from "./record-title-block";
import { Revisions } from "./revisions";
import { RunFacts } from "./run-facts";
import { SecondRun } from "./second-run";
import { SettleOut } from "./settle-out";
import { SheetActions } from "./sheet-actions";
import { Signatures } from "./signatures";
import { Standing } from "./standing";
import { StandingCautions } from "./standing-cautions";
import { SteelFire } from "./steel-fire";
import { VerdictHead } from "./verdict-head";
import { Warnings } from "./warnings";
import { WholeRun } from "./whole-run";

/**
 * The sheet of one revision: the finding, what it is held against, the cautions, then the curves and what they rest on.
 *
 * acts   acts of signatures that stand beside the sheet's own buttons
 */
export function ScreeningSheet({ screening, acts }: { screening: ScreeningView; acts?: ReactNode }) {
  const { prepared, may, id, signatures } = screening;
  const edits = may.edit ? { edits: id } : {};
  const sheet = (
    <SheetWithMargin
      titleBlock={<RecordTitleBlock screening={screening} />}
      margin={
        <>
          {prepared && <AssumedMargin content={prepared.content} />}
          {prepared && <RunFacts prepared={prepared} />}
          <Revisions screening={screening} />
        </>
      }
    >
      <Standing screening={screening} />
      {prepared ? <Computed prepared={prepared} edits={edits.edits} /> : <NotComputed screening={screening} />}
      <div className="mt-8">
        <Signatures signatures={signatures} {...edits} />
      </div>
      <SheetActions screening={screening} more={acts} />
    </SheetWithMargin>
  );
  return prepared ? <SitePressure barometricPressurePa={prepared.content.barometricPressurePa}>{sheet}</SitePressure> : sheet;
}

function Computed({ prepared, edits }: { prepared: PreparedView; edits: string | undefined }) {
  const { content, runs, stale } = prepared;
  return (
    <>
      <VerdictHead content={content} runs={runs} />
      {content.cases.map((recordCase) => {
        const run = runs.find(({ letter }) => letter === recordCase.letter);
        if (!run) return null;
        return (
          <section key={recordCase.letter} aria-label={`Limits of case ${recordCase.letter}`}>
            {content.cases.length > 1 && (
              <h2 className="mb-1 mt-4">
                {recordCase.letter} {caseKindWords[recordCase.kind]}
              </h2>
            )}
            <Limits recordCase={recordCase} run={run} />
          </section>
        );
      })}
      <StandingCautions content={content} />
      <Warnings cases={content.cases} />
      {content.cases.map((recordCase) => {
        const run = runs.find(({ letter }) => letter === recordCase.letter);
        if (!run) return null;
        return (
          <section key={recordCase.letter} aria-label={`Run of case ${recordCase.letter}`}>
            {content.cases.length > 1 && <h2 className="mt-6">Case {recordCase.letter}</h2>}
            <Charts run={run} stale={stale} />
            <SettleOut run={run} />
            <SteelFire run={run} />
            <div className="mt-7 grid grid-cols-2 items-start gap-9 rail:grid-cols-1 rail:gap-6">
              <EnergyLedger run={run} />
              <div className="grid gap-7">
                <WholeRun run={run} />
                <SecondRun recordCase={recordCase} run={run} />
                <AfterBlowdown run={run} />
              </div>
            </div>
          </section>
        );
      })}
      <div className="mt-8">
        <Inputs content={content} {...(edits ? { edits } : {})} />
      </div>
    </>
  );
}

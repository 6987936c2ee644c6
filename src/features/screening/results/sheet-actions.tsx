import type { ReactNode } from "react";
import { ButtonLink } from "@/components/button/button-link";
import { ButtonRow } from "@/components/shell/page-head";
import { pages } from "@/contracts/paths";
import type { ScreeningView } from "@/contracts/views";
import { ComputeButton } from "./compute-button";
import { DataButton } from "./data-button";
import { NewRevisionButton } from "./new-revision-button";

/**
 * What this person may do with the revision now.
 *
 * more   acts that belong elsewhere: withdrawing takes a signature
 */
export function SheetActions({ screening, more }: { screening: ScreeningView; more?: ReactNode }) {
  const { id, rev, state, may, draft, prepared } = screening;
  const shown = rev === screening.revisions[0]?.rev ? undefined : rev;
  return (
    <ButtonRow>
      {may.sign && (
        <ButtonLink kind="main" href={pages.sign(id)}>
          Review and sign
        </ButtonLink>
      )}
      {may.decide && (
        <ButtonLink kind="main" href={pages.decide(id)}>
          Decide
        </ButtonLink>
      )}
      {may.revise && <NewRevisionButton screeningId={id} rev={rev} returned={state === "returned"} />}
      {draft && prepared && may.edit && <ButtonLink href={pages.part(id, "scope")}>Back to the lines</ButtonLink>}
      {draft && may.compute && prepared && !prepared.stale && <ComputeButton draft={draft}>Compute again</ComputeButton>}
      {prepared && (prepared.content.cases.length > 1 || screening.revisions.length > 1) && (
        <ButtonLink href={pages.compare(id)}>Side by side</ButtonLink>
      )}
      {prepared && <ButtonLink href={pages.studies(id, shown)}>How sure</ButtonLink>}
      {prepared && <ButtonLink href={pages.window(id, shown)}>Window of bores</ButtonLink>}
      {prepared && <DataButton prepared={prepared} />}
      {more}
    </ButtonRow>
  );
}

import Link from "next/link";
import { Notice } from "@/components/caution/notice";
import { pages } from "@/contracts/paths";
import type { ScreeningView } from "@/contracts/views";
import { ComputeButton } from "./compute-button";
import { Remarks } from "./signatures";

/** What a reader must know of this revision before its figures: that it is not the newest, not in force, not of the lines as they stand. */
export function Standing({ screening }: { screening: ScreeningView }) {
  const { id, rev, state, revisions, prepared, draft, may, whyNot, signatures } = screening;
  const newest = revisions[0];
  const returned = signatures.filter(({ act }) => act === "returned").flatMap(({ remarks }) => remarks);
  return (
    <div className="grid gap-3 empty:hidden [&:not(:empty)]:mb-[18px]">
      {newest && newest.rev > rev && (
        <Notice
          tone="caution"
          title={state === "superseded" ? `Superseded by revision ${newest.rev}.` : `This is revision ${rev} of ${newest.rev}.`}
        >
          <Link href={pages.screening(id)}>Read revision {newest.rev}</Link>, the newest.
        </Notice>
      )}
      {state === "withdrawn" && (
        <Notice tone="error" title="Withdrawn.">
          This revision must not be used any longer. {signatures.at(-1)?.badge} withdrew it.
        </Notice>
      )}
      {state === "returned" && returned.length > 0 && (
        <Notice
          tone="caution"
          title={`Returned by ${returned[0]?.by} with ${returned.length === 1 ? "1 remark" : `${returned.length} remarks`}.`}
        >
          {may.revise ? "A new revision answers them; this one stays as it is." : "A new revision answers them."}
          <div className="pt-2 text-ink">
            <Remarks remarks={returned} />
          </div>
        </Notice>
      )}
      {prepared?.stale && (
        <Notice tone="caution" title="The lines have changed since this was computed.">
          The figures below are of the lines as they were, and can’t be signed.
          {may.compute && draft && (
            <span className="mt-2 flex flex-wrap items-center gap-3">
              <ComputeButton draft={draft}>Compute again</ComputeButton>
            </span>
          )}
        </Notice>
      )}
      {draft && draft.answers.length > 0 && draft.editable && (
        <Notice tone="caution" title="This revision answers remarks.">
          <div className="pt-2 text-ink">
            <Remarks remarks={draft.answers} edits={id} />
          </div>
        </Notice>
      )}
      {whyNot && <Notice tone="caution">{whyNot}</Notice>}
    </div>
  );
}

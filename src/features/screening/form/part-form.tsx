"use client";

import Link from "next/link";
import { useId, useMemo, useState, type ReactNode } from "react";
import { Button } from "@/components/button/button";
import { ButtonLink } from "@/components/button/button-link";
import { Notice } from "@/components/caution/notice";
import { MarginNote } from "@/components/shell/margin";
import { ButtonRow, GroupHead, PartHead } from "@/components/shell/page-head";
import { FormSheet } from "@/components/shell/sheet";
import { TitleBlock } from "@/components/shell/title-block";
import { SourceKeys } from "@/components/line/source-note";
import { PartList } from "@/components/parts/part-list";
import { KeptWord } from "@/components/parts/kept-word";
import { StateWord } from "@/components/verdict/state-word";
import { askedKeysOf, caseKindWords } from "@/contracts/draft";
import type { LineKey } from "@/contracts/lines/line";
import { parts, partBySlug, type PartSlug } from "@/contracts/lines/parts";
import { pages } from "@/contracts/paths";
import { Forerun } from "../forerun/forerun";
import { ForerunBar } from "../forerun/forerun-bar";
import { ForerunSaid } from "../forerun/forerun-said";
import { CaseTabs } from "./case-tabs";
import { ComputeButton } from "./compute-button";
import { ConflictDialog } from "./conflict-dialog";
import { useDraft } from "./draft-context";
import { FillDialog } from "./fill-dialog";
import { FormKeys } from "./form-keys";
import { InventoryFigure, StartSentence } from "./inventory-figure";
import { lineAddress } from "./line-address";
import { LineRow } from "./line-row";
import { partStatuses } from "./part-status";
import { ScopeFacts } from "./scope-facts";
import { PasteContext } from "./use-paste-column";

/**
 * One part of the form: its lines in groups, the part list at the left, the Forerun at the right.
 *
 * below   stands under the lines of the part
 */
export function PartForm({ slug, below }: { slug: PartSlug; below?: ReactNode }) {
  const held = useDraft();
  const { draft, letter, made, cases, subject, start, keeper, editable } = held;
  const [pasted, setPasted] = useState<{ from: LineKey; cells: string[] } | null>(null);
  const [forerunOpen, setForerunOpen] = useState(false);
  const forerunId = useId();
  const part = partBySlug(slug) ?? parts[0];
  const statuses = useMemo(() => partStatuses(draft, letter, made), [draft, letter, made]);
  const asked = askedKeysOf(draft, letter).filter(({ line }) => line.part === part.part);
  const groups = [...new Set(asked.map(({ line }) => line.group))];
  const at = parts.indexOf(part);
  const [before, after] = [parts[at - 1], parts[at + 1]];
  const offerColumn = useMemo(() => (from: LineKey, cells: string[]) => setPasted({ from, cells }), []);

  const casesWords = part.perCase
    ? `${letter} ${caseKindWords[cases.find((one) => one.letter === letter)?.kind ?? "cold-blowdown"]}`
    : cases.map((one) => `${one.letter} ${caseKindWords[one.kind]}`).join(", ");
  const listed = (perCase: boolean) =>
    parts
      .filter((one) => one.perCase === perCase)
      .map((one) => {
        const status = statuses.find(({ part: number }) => number === one.part);
        return {
          no: one.part,
          name: one.title,
          href: pages.part(subject.screeningId, one.slug, undefined, letter),
          note: status?.note ?? "",
          state: status?.state ?? ("untouched" as const),
          current: one === part,
        };
      });

  return (
    <PasteContext.Provider value={offerColumn}>
      <FormSheet
        titleBlock={
          <TitleBlock
            cells={[
              { label: "Record", value: subject.record },
              { label: "Rev", value: start.rev },
              { label: "Section", value: `${subject.section.tag} ${subject.section.name}`, wide: true },
              { label: cases.length > 1 ? "Cases" : "Case", value: casesWords, wide: true },
              { label: "Prepared by", value: subject.author },
              { label: "State", value: <StateWord state="draft" /> },
              { label: "Kept", value: <KeptWord keeping={keeper.keeping} /> },
            ]}
          />
        }
        parts={
          <PartList
            groups={[
              { head: "For all cases", parts: listed(false) },
              { head: `For case ${letter}`, parts: listed(true) },
            ]}
          />
        }
        forerun={<Forerun />}
        forerunId={forerunId}
        forerunOpen={forerunOpen}
        forerunBar={<ForerunBar controls={forerunId} open={forerunOpen} onToggle={() => setForerunOpen((open) => !open)} />}
      >
        {keeper.trouble && (
          <Notice tone="error" title="Not kept.">
            {keeper.trouble}
          </Notice>
        )}
        {!editable && (
          <Notice tone="caution" title="Read only.">
            These lines are shown as they stand. Engineers of the facility change them.
          </Notice>
        )}
        {keeper.taken && (
          <Notice tone="caution" title="Taken over.">
            {keeper.taken.by} changed {keeper.taken.lines.length === 1 ? "line" : "lines"} {keeper.taken.lines.join(", ")}{" "}
            meanwhile. They stand here now.{" "}
            <Button kind="quiet" onClick={keeper.forgetTaken}>
              Close this note
            </Button>
          </Notice>
        )}
        {start.answers.map((remark) => (
          <MarginNote key={`${remark.line}${remark.text}`} no={remark.line}>
            {remark.by} remarked: “{remark.text}”
          </MarginNote>
        ))}
        {part.perCase && <CaseTabs slug={part.slug} />}
        <PartHead no={part.part} title={part.title}>
          <SourceKeys />
        </PartHead>
        {part.slug === "scope" && <ScopeFacts />}
        {part.slug === "inventory" && <InventoryFigure />}
        {groups.map((group) => (
          <section key={group} aria-label={group}>
            <GroupHead>{group}</GroupHead>
            {asked
              .filter(({ line }) => line.group === group)
              .map(({ key, line }) => (
                <LineRow key={key} line={line} lineKey={key} />
              ))}
          </section>
        ))}
        {part.slug === "inventory" && <StartSentence />}
        {below}
        <ButtonRow>
          {before && (
            <ButtonLink
              href={pages.part(subject.screeningId, before.slug, undefined, letter)}
            >{`${before.part}\u2002${before.title}`}</ButtonLink>
          )}
          {after && (
            <ButtonLink kind="main" href={pages.part(subject.screeningId, after.slug, undefined, letter)}>
              {`${after.part}\u2002${after.title}`}
            </ButtonLink>
          )}
          <ComputeButton main={!after} />
        </ButtonRow>
        {made.withoutSource.length > 0 && (
          <p className="pt-3 text-small text-ink-3">
            Without a source, and so not yet ready to sign:{" "}
            {made.withoutSource.map((key) => (
              <Link key={key} href={lineAddress(subject.screeningId, key)} className="mr-2">
                {key}
              </Link>
            ))}
          </p>
        )}
        <FormKeys />
        <ForerunSaid />
      </FormSheet>
      {keeper.conflict && <ConflictDialog conflict={keeper.conflict} onSettle={keeper.settle} />}
      {pasted && <FillDialog from={pasted.from} cells={pasted.cells} onClose={() => setPasted(null)} />}
    </PasteContext.Provider>
  );
}

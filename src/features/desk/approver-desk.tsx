import type { ReactNode } from "react";
import Link from "next/link";
import { ButtonLink } from "@/components/button/button-link";
import { SourceMark } from "@/components/line/source-mark";
import { MarginHead, MarginNote } from "@/components/shell/margin";
import { SheetWithMargin } from "@/components/shell/sheet";
import { EmptyState } from "@/components/states/empty-state";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import { EbbThumb } from "@/components/verdict/ebb-thumb";
import { VerdictWord } from "@/components/verdict/verdict-word";
import { pages } from "@/contracts/paths";
import type { DeskView } from "@/contracts/views";
import { since } from "./long-date";

/**
 * An approver's first page: what waits for the countersign, oldest first.
 *
 * children   the table of what they have decided
 */
export function ApproverDesk({ desk, now, children }: { desk: DeskView; now: string; children: ReactNode }) {
  const waits = [...desk.waits].sort((a, b) => a.changedAt.localeCompare(b.changedAt));
  return (
    <SheetWithMargin margin={<BeforeYouCountersign />}>
      {waits.length > 0 ? (
        <>
          <h1 className="mb-1">{waitWords(waits.length)}</h1>
          <p className="mb-[18px] font-serif text-prose text-ink-3">
            Oldest first. You cannot countersign a record you prepared.
          </p>
          <Queue waits={waits} now={now} />
        </>
      ) : (
        <>
          <h1 className="mb-4">Desk</h1>
          <EmptyState title="No record waits for your countersign." />
        </>
      )}
      <h2 className="mb-1 mt-9">Settled by you</h2>
      {children}
    </SheetWithMargin>
  );
}

function Queue({ waits, now }: { waits: DeskView["waits"]; now: string }) {
  return (
    <Table caption="Records that wait for your countersign">
      <thead>
        <tr>
          <HeadCell>Record</HeadCell>
          <HeadCell>Ebb</HeadCell>
          <HeadCell>Section and title</HeadCell>
          <HeadCell>Governs</HeadCell>
          <HeadCell>Verdict</HeadCell>
          <HeadCell>Signed by</HeadCell>
          <HeadCell numeric>Waits</HeadCell>
          <HeadCell />
        </tr>
      </thead>
      <tbody>
        {waits.map((row) => (
          <Row key={row.id}>
            <Cell strong unbroken>
              <Link href={pages.screening(row.id)}>{row.record}</Link>{" "}
              <span className="font-normal text-ink-3">rev {row.rev}</span>
            </Cell>
            <Cell>
              <EbbThumb ebb={row.ebb} />
            </Cell>
            <Cell wholeRow>
              <span className="font-medium">
                {row.section.tag} {row.section.name}
              </span>
              <br />
              <span className="text-ink-3">
                {row.title}
                {row.facility.demo && " demo"}
              </span>
            </Cell>
            <Cell wholeRow>
              <span className="font-serif">{row.sentence}</span>
            </Cell>
            <Cell>{row.verdict && <VerdictWord verdict={row.verdict} />}</Cell>
            <Cell label="Signed by">{row.author.badge}</Cell>
            <Cell numeric label="Waits">
              {since(row.changedAt, now)}
            </Cell>
            <Cell wholeRow>
              <ButtonLink href={pages.decide(row.id)} aria-label={`Read ${row.record}`}>
                Read
              </ButtonLink>
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

function BeforeYouCountersign() {
  return (
    <>
      <MarginHead>Before you countersign</MarginHead>
      <MarginNote no="1">
        Read what was assumed. Assumed lines carry an open diamond <SourceMark kind="assumed" /> and are listed first.
      </MarginNote>
      <MarginNote no="2">Read what governs. One figure decides the verdict; the sheet names it in the first sentence.</MarginNote>
      <MarginNote no="3">
        Decide whether it holds for this section, in this state, under your local code. Your countersign says so.
      </MarginNote>
    </>
  );
}

const words = ["No", "One", "Two", "Three", "Four", "Five", "Six", "Seven", "Eight", "Nine"];
const waitWords = (count: number): string =>
  count === 1 ? "One record waits for your countersign" : `${words[count] ?? count} records wait for your countersign`;

import Link from "next/link";
import { formatUtc } from "@/components/quantity/format-time";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import { EbbThumb } from "@/components/verdict/ebb-thumb";
import { StateWord } from "@/components/verdict/state-word";
import { VerdictWord } from "@/components/verdict/verdict-word";
import { pages } from "@/contracts/paths";
import type { ScreeningRow } from "@/contracts/views";

/**
 * Screenings as listed: record, its own ebb, what it is of (demo data says so), where it stands, the verdict.
 *
 * now       the server's time, so that this year's dates go without their year
 * section   leaves the section's name out where the page says it already
 */
export function ScreeningTable({
  rows,
  caption,
  now,
  section = true,
}: {
  rows: readonly ScreeningRow[];
  caption: string;
  now: string;
  section?: boolean;
}) {
  return (
    <Table caption={caption}>
      <thead>
        <tr>
          <HeadCell>Record</HeadCell>
          <HeadCell>Ebb</HeadCell>
          <HeadCell>{section ? "Section and title" : "Title"}</HeadCell>
          <HeadCell>State</HeadCell>
          <HeadCell>Verdict</HeadCell>
          <HeadCell>By</HeadCell>
          <HeadCell numeric>Last change, UTC</HeadCell>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <Row key={row.id}>
            <Cell strong unbroken>
              <Link href={pages.screening(row.id)}>{row.record}</Link>{" "}
              <span className="font-normal text-ink-3">rev {row.rev}</span>
            </Cell>
            <Cell>
              <EbbThumb ebb={row.ebb} />
            </Cell>
            <Cell wholeRow>
              {section && (
                <>
                  <span className="font-medium">
                    {row.section.tag} {row.section.name}
                  </span>
                  <br />
                </>
              )}
              <span className={section ? "text-ink-3" : "font-medium"}>{row.title}</span>
              {row.facility.demo && <span className="text-ink-3"> demo</span>}
            </Cell>
            <Cell>
              <StateWord state={row.state} />
            </Cell>
            <Cell>{row.verdict ? <VerdictWord verdict={row.verdict} /> : <span className="text-ink-3">Not computed</span>}</Cell>
            <Cell label="By">{row.author.badge}</Cell>
            <Cell numeric label="Last change, UTC">
              <time dateTime={row.changedAt}>{formatUtc(row.changedAt, now)}</time>
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

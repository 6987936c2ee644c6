import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import type { RecordContent } from "@/contracts/record-content";
import { labelOfLine } from "./cited-line";

/** Lines that read otherwise than in the revision before, as the record states them. */
export function ChangedSince({ content }: { content: RecordContent }) {
  if (content.rev === 1) return null;
  return (
    <section>
      <h2 className="mb-1 mt-7">Changed since revision {content.rev - 1}</h2>
      {content.reason && <p className="pb-2 font-serif text-prose text-ink-2">{content.reason}</p>}
      {content.changedSince.length === 0 ? (
        <p className="border-t py-2.5 font-serif text-prose text-ink-2">No line changed.</p>
      ) : (
        <Table caption={`Changed since revision ${content.rev - 1}`}>
          <thead>
            <tr>
              <HeadCell>Line</HeadCell>
              <HeadCell>What</HeadCell>
              <HeadCell>Rev {content.rev - 1}</HeadCell>
              <HeadCell>Rev {content.rev}</HeadCell>
            </tr>
          </thead>
          <tbody>
            {content.changedSince.map(({ line, before, after }) => (
              <Row key={line}>
                <Cell unbroken>
                  <span className="line-no">{line}</span>
                </Cell>
                <Cell>{labelOfLine(line, content)}</Cell>
                <Cell label={`Rev ${content.rev - 1}`}>{before}</Cell>
                <Cell label={`Rev ${content.rev}`} strong>
                  {after}
                </Cell>
              </Row>
            ))}
          </tbody>
        </Table>
      )}
    </section>
  );
}

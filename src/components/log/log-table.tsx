import type { ReactNode } from "react";
import { Cell, HeadCell, Row, Table } from "../table/table";
import { SealWord, type Seal } from "./seal-word";

/**
 * One entry as listed.
 *
 * seq     number of the entry, as a link where it opens
 * time    as shown, UTC
 */
export type LogRow = {
  seq: number;
  entry: ReactNode;
  time: string;
  by: ReactNode;
  record: ReactNode;
  what: ReactNode;
  seal: Seal;
  chosen?: boolean;
};

/** Entries of the log, newest first, each with what checking its seal found. */
export function LogTable({ rows, caption }: { rows: readonly LogRow[]; caption: string }) {
  return (
    <Table caption={caption}>
      <thead>
        <tr>
          <HeadCell>Entry</HeadCell>
          <HeadCell>Time</HeadCell>
          <HeadCell>By</HeadCell>
          <HeadCell>Record</HeadCell>
          <HeadCell>What happened</HeadCell>
          <HeadCell>Seal</HeadCell>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <Row key={row.seq} chosen={row.chosen}>
            <Cell strong unbroken>
              {row.entry}
            </Cell>
            <Cell unbroken>{row.time}</Cell>
            <Cell label="By">{row.by}</Cell>
            <Cell label="Record" unbroken>
              {row.record}
            </Cell>
            <Cell wholeRow>{row.what}</Cell>
            <Cell>
              <SealWord seal={row.seal} />
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

/** Where an entry stands: the one before, itself, the one after, on one line. */
export function ChainPlace({
  links,
}: {
  links: readonly { name: ReactNode; digest: string; note?: ReactNode; here?: boolean }[];
}) {
  return (
    <ol className="relative pl-[26px] before:absolute before:bottom-2 before:left-[7px] before:top-2 before:border-l-2 before:border-ink">
      {links.map(({ name, digest, note, here }, index) => (
        <li
          key={index}
          aria-current={here || undefined}
          className={`relative py-2 before:absolute before:-left-6 before:top-3.5 before:h-2.5 before:w-2.5 before:border-2 before:border-ink ${
            here ? "before:bg-ink" : "before:bg-tint"
          }`}
        >
          <b>{name}</b> <span className="digest">{digest}</span>
          {note && <span className="block text-small text-ink-3">{note}</span>}
        </li>
      ))}
    </ol>
  );
}

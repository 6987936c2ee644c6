"use client";

import Link from "next/link";
import { LogTable } from "@/components/log/log-table";
import { formatUtc } from "@/components/quantity/format-time";
import type { EntryRow } from "@/contracts/views";
import { sealOf, useVerification } from "./verification";

/**
 * A page of the log.
 *
 * rows   each with the address that opens it beside the list
 */
export function EntryList({
  rows,
  chosen,
  now,
}: {
  rows: readonly (EntryRow & { href: string })[];
  chosen: number | null;
  now: string;
}) {
  const { verdictOf } = useVerification();
  return (
    <LogTable
      caption="Entries of the log, newest first"
      rows={rows.map((row) => ({
        seq: row.seq,
        entry: (
          <Link href={row.href} scroll={false}>
            {row.seq}
          </Link>
        ),
        time: formatUtc(row.at, now),
        by: row.by,
        record: row.record ? `${row.record}${row.rev ? ` rev ${row.rev}` : ""}` : "–",
        what: row.what,
        seal: sealOf(verdictOf(row.seq)),
        chosen: row.seq === chosen,
      }))}
    />
  );
}

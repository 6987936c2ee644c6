import type { Metadata } from "next";
import Link from "next/link";
import { PageHead } from "@/components/shell/page-head";
import { Stop } from "@/components/states/stop";
import { EmptyState } from "@/components/states/empty-state";
import { ButtonLink } from "@/components/button/button-link";
import { pages } from "@/contracts/paths";
import { logFilterSchema } from "@/contracts/requests";
import { AboutTheLog } from "@/features/log/about-the-log";
import { EntryDetail } from "@/features/log/entry-detail";
import { EntryList } from "@/features/log/entry-list";
import { LogFilterForm } from "@/features/log/log-filter";
import { LogLayout } from "@/features/log/log-layout";
import { VerificationProvider } from "@/features/log/verification";
import { VerifyPanel } from "@/features/log/verify-panel";
import { requireViewer } from "@/server/auth/viewer";
import { getDesk } from "@/server/desk/read";
import { getEntry, listLog } from "@/server/log/read";
import { getScreening } from "@/server/screenings/read";
import { filterFrom, withQuery, type SearchParams } from "../query";

export const metadata: Metadata = { title: "Log" };

export default async function LogPage({ searchParams }: { searchParams: Promise<SearchParams> }) {
  const viewer = await requireViewer();
  const params = await searchParams;
  const filter = filterFrom(logFilterSchema, params);
  const { before, limit: _, ...kept } = filter;
  const filtered = Object.keys(kept).length > 0;
  const seq = entryAsked(params.entry);
  const [{ rows, total, next }, desk, entry] = await Promise.all([
    listLog(viewer, filter),
    getDesk(viewer),
    seq === null ? null : getEntry(viewer, seq),
  ]);
  const address = (change: Record<string, number | undefined>) =>
    withQuery(pages.log, { ...kept, before, entry: seq ?? undefined, ...change });
  const { size } = desk.log;

  return (
    <VerificationProvider>
      <LogLayout
        chosen={seq !== null}
        entry={
          entry ? (
            <EntryDetail
              entry={entry}
              screeningId={await openScreening(viewer, entry.subject)}
              around={{
                before: entry.neighbours.before && address({ entry: entry.neighbours.before.seq }),
                after: entry.neighbours.after && address({ entry: entry.neighbours.after.seq }),
                list: address({ entry: undefined }),
              }}
            />
          ) : seq === null ? (
            <AboutTheLog />
          ) : (
            <Stop
              title={`There is no entry ${seq} for you to read`}
              action={<Link href={address({ entry: undefined })}>All entries</Link>}
            >
              It does not exist, or what it is about is not open to you.
            </Stop>
          )
        }
      >
        <PageHead title="Screening log" />
        <VerifyPanel size={size} start={params.verify === "now"} />
        <LogFilterForm filter={kept} />
        <p className="py-1.5 text-small text-ink-3">
          {total} of {size} entries. Times in UTC.
        </p>
        {rows.length > 0 ? (
          <EntryList
            rows={rows.map((row) => ({ ...row, href: address({ entry: row.seq }) }))}
            chosen={seq}
            now={new Date().toISOString()}
          />
        ) : filtered ? (
          <EmptyState title="No entry matches." action={<ButtonLink href={pages.log}>Clear filters</ButtonLink>}>
            The log has {size} entries in all.
          </EmptyState>
        ) : (
          <EmptyState title="No entry is open to you yet.">The log has {size} entries in all.</EmptyState>
        )}
        <nav aria-label="Pages of the log" className="flex items-center justify-between gap-3 pt-3 text-small">
          <span className="text-ink-3">{rows.length > 0 && `Entries ${rows[0]?.seq} to ${rows.at(-1)?.seq}`}</span>
          <span className="flex gap-4">
            {before !== undefined && <Link href={address({ before: undefined })}>Newest</Link>}
            {next !== null && <Link href={address({ before: next })}>Older</Link>}
          </span>
        </nav>
      </LogLayout>
    </VerificationProvider>
  );
}

function entryAsked(entry: string | string[] | undefined): number | null {
  return typeof entry === "string" && /^[1-9]\d{0,14}$/.test(entry) ? Number(entry) : null;
}

/** Id of the screening that a subject names, if the viewer may open it. */
async function openScreening(viewer: Awaited<ReturnType<typeof requireViewer>>, subject: string): Promise<string | null> {
  const [noun, id, rev] = subject.split(":");
  if (noun !== "screening" || !id) return null;
  return (await getScreening(viewer, id, Number(rev))) ? id : null;
}

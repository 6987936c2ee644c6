import type { Metadata } from "next";
import Link from "next/link";
import { ButtonLink } from "@/components/button/button-link";
import { PageHead } from "@/components/shell/page-head";
import { Sheet, SheetBody } from "@/components/shell/sheet";
import { EmptyState } from "@/components/states/empty-state";
import { pages } from "@/contracts/paths";
import { screeningFilterSchema } from "@/contracts/requests";
import { NoScreenings } from "@/features/screening/list/no-screenings";
import { ScreeningFilterForm } from "@/features/screening/list/screening-filter";
import { ScreeningTable } from "@/features/screening/list/screening-table";
import { requireViewer } from "@/server/auth/viewer";
import { listScreenings } from "@/server/screenings/read";
import { listSections } from "@/server/sections/read";
import { allowed } from "../allowed";
import { NotForRole } from "../not-for-role";
import { filterFrom, withQuery, type SearchParams } from "../query";

export const metadata: Metadata = { title: "Screenings" };

export default async function ScreeningsPage({ searchParams }: { searchParams: Promise<SearchParams> }) {
  const viewer = await requireViewer();
  const filter = filterFrom(screeningFilterSchema, await searchParams);
  const read = await allowed(Promise.all([listScreenings(viewer, filter), listSections(viewer)]));
  if (!read) return <NotForRole viewer={viewer} what="Screenings" who={["engineer", "approver", "auditor"]} />;
  const [{ rows, total, next }, sections] = read.found;
  const { before, limit: _, ...kept } = filter;
  const filtered = Object.keys(kept).length > 0;
  const mayCreate = viewer.role === "engineer";

  return (
    <Sheet>
      <SheetBody>
        <PageHead title="Screenings">
          {mayCreate && (
            <ButtonLink kind="main" href={pages.newScreening(filter.sectionId)}>
              New screening
            </ButtonLink>
          )}
        </PageHead>
        <ScreeningFilterForm filter={kept} sections={sections} />
        <p className="py-1.5 text-small text-ink-3">
          {total === 1 ? "1 screening" : `${total} screenings`}
          {filtered && " match"}. Newest number first. Times in UTC.
        </p>
        {rows.length > 0 ? (
          <ScreeningTable rows={rows} caption="Screenings" now={new Date().toISOString()} />
        ) : filtered ? (
          <EmptyState title="No screening matches." action={<ButtonLink href={pages.screenings}>Clear filters</ButtonLink>} />
        ) : (
          <NoScreenings mayCreate={mayCreate} />
        )}
        <nav aria-label="Pages of the list" className="flex justify-between gap-3 pt-3 text-small">
          <span>{before !== undefined && <Link href={withQuery(pages.screenings, kept)}>Newest</Link>}</span>
          <span>{next !== null && <Link href={withQuery(pages.screenings, { ...kept, before: next })}>Older</Link>}</span>
        </nav>
      </SheetBody>
    </Sheet>
  );
}

import type { Metadata } from "next";
import Link from "next/link";
import { PageHead } from "@/components/shell/page-head";
import { Sheet, SheetBody } from "@/components/shell/sheet";
import { EmptyState } from "@/components/states/empty-state";
import { pages } from "@/contracts/paths";
import { NewSectionButton } from "@/features/section/new-section-button";
import { SectionTable } from "@/features/section/section-table";
import { requireViewer } from "@/server/auth/viewer";
import { listFacilities } from "@/server/facilities/read";
import { listSections } from "@/server/sections/read";
import { allowed } from "../allowed";
import { NotForRole } from "../not-for-role";

export const metadata: Metadata = { title: "Sections" };

export default async function SectionsPage() {
  const viewer = await requireViewer();
  const read = await allowed(Promise.all([listSections(viewer), listFacilities(viewer)]));
  if (!read) return <NotForRole viewer={viewer} what="Sections" who={["engineer", "approver", "auditor"]} />;
  const [sections, facilities] = read.found;

  return (
    <Sheet>
      <SheetBody>
        <PageHead title="Sections">{viewer.role === "engineer" && <NewSectionButton facilities={facilities} />}</PageHead>
        {facilities.length === 0 && (
          <EmptyState title="You belong to no facility yet.">
            An administrator can add you to one; its sections then stand here.
          </EmptyState>
        )}
        {facilities.map(({ id, name, demo }) => {
          const own = sections.filter(({ facility }) => facility.id === id);
          return (
            <section key={id} className="mb-8">
              <h2 className="mb-1">
                <Link href={pages.facility(id)}>{name}</Link>
                {demo && <span className="text-body text-ink-3"> demo, invented</span>}
              </h2>
              {own.length > 0 ? (
                <SectionTable sections={own} caption={`Sections of ${name}`} />
              ) : (
                <p className="border-t py-3 font-serif text-prose text-ink-2">No section yet.</p>
              )}
            </section>
          );
        })}
      </SheetBody>
    </Sheet>
  );
}

import type { Metadata } from "next";
import Link from "next/link";
import { notFound } from "next/navigation";
import { ButtonLink } from "@/components/button/button-link";
import { PageHead } from "@/components/shell/page-head";
import { Sheet, SheetBody } from "@/components/shell/sheet";
import { TitleBlock } from "@/components/shell/title-block";
import { pages } from "@/contracts/paths";
import { NoScreenings } from "@/features/screening/list/no-screenings";
import { ScreeningTable } from "@/features/screening/list/screening-table";
import { requireViewer } from "@/server/auth/viewer";
import { getSection } from "@/server/sections/read";

export const metadata: Metadata = { title: "Section" };

export default async function SectionPage({ params }: { params: Promise<{ sectionId: string }> }) {
  const viewer = await requireViewer();
  const section = await getSection(viewer, (await params).sectionId);
  if (!section) notFound();
  const { id, tag, name, description, facility, screenings } = section;
  const mayCreate = viewer.role === "engineer";
  const [newest] = screenings;

  return (
    <Sheet>
      <TitleBlock
        cells={[
          { label: "Section", value: `${tag} ${name}`, wide: true },
          { label: "Facility", value: <Link href={pages.facility(facility.id)}>{facility.name}</Link> },
          { label: "Screenings", value: screenings.length },
        ]}
      />
      <SheetBody>
        <PageHead title={`${tag} ${name}`}>
          {newest && <ButtonLink href={pages.fluid(newest.id)}>{`Fluid of ${newest.record}`}</ButtonLink>}
          {mayCreate && (
            <ButtonLink kind="main" href={pages.newScreening(id)}>
              New screening
            </ButtonLink>
          )}
        </PageHead>
        {description && <p className="-mt-3 mb-5 max-w-[70ch] font-serif text-prose text-ink-2">{description}</p>}
        <h2 className="mb-1">Screenings of this section</h2>
        {screenings.length > 0 ? (
          <ScreeningTable rows={screenings} caption={`Screenings of ${tag}`} now={new Date().toISOString()} section={false} />
        ) : (
          <NoScreenings mayCreate={mayCreate} sectionId={id} />
        )}
      </SheetBody>
    </Sheet>
  );
}

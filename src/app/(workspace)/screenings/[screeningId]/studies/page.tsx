import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { ButtonLink } from "@/components/button/button-link";
import { SheetWithMargin } from "@/components/shell/sheet";
import { EmptyState } from "@/components/states/empty-state";
import { SitePressure } from "@/components/units/units-provider";
import { pages } from "@/contracts/paths";
import { RecordTitleBlock } from "@/features/screening/results/record-title-block";
import { StudiesSheet } from "@/features/screening/studies/studies-sheet";
import { requireViewer } from "@/server/auth/viewer";
import { getScreening } from "@/server/screenings/read";
import { withQuery } from "../../../query";
import { revisionAsked } from "../revision-asked";

export const metadata: Metadata = { title: "How sure" };

type Props = {
  params: Promise<{ screeningId: string }>;
  searchParams: Promise<{ rev?: string | string[]; case?: string | string[] }>;
};

export default async function StudiesPage({ params, searchParams }: Props) {
  const viewer = await requireViewer();
  const [{ screeningId }, query] = await Promise.all([params, searchParams]);
  const rev = revisionAsked(query.rev);
  const screening = await getScreening(viewer, screeningId, rev);
  if (!screening) notFound();
  const titleBlock = <RecordTitleBlock screening={screening} />;
  const back = <ButtonLink href={pages.screening(screeningId, rev)}>Back to the sheet</ButtonLink>;
  const { prepared } = screening;
  const run = prepared?.runs.find(({ letter }) => letter === query.case) ?? prepared?.runs[0];
  if (!prepared || !run) {
    return (
      <SheetWithMargin titleBlock={titleBlock} margin={null}>
        <EmptyState title="Nothing is computed yet" action={back}>
          Studies start from a computed case. Compute it in full first.
        </EmptyState>
      </SheetWithMargin>
    );
  }
  const cases = prepared.content.cases.map(({ letter, kind }) => ({
    letter,
    kind,
    href: withQuery(pages.studies(screeningId), { rev, case: letter }),
  }));
  return (
    <SitePressure barometricPressurePa={prepared.content.barometricPressurePa}>
      <StudiesSheet run={run} cases={cases} titleBlock={titleBlock} back={back} />
    </SitePressure>
  );
}

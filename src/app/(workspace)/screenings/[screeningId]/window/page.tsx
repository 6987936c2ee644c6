import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { ButtonLink } from "@/components/button/button-link";
import { SheetWithMargin } from "@/components/shell/sheet";
import { EmptyState } from "@/components/states/empty-state";
import { SitePressure } from "@/components/units/units-provider";
import { pages } from "@/contracts/paths";
import { RecordTitleBlock } from "@/features/screening/results/record-title-block";
import { sizingOf } from "@/features/screening/studies/sizing-of";
import { WindowSheet } from "@/features/screening/studies/window-sheet";
import { requireViewer } from "@/server/auth/viewer";
import { getScreening } from "@/server/screenings/read";
import { revisionAsked } from "../revision-asked";

export const metadata: Metadata = { title: "Window of bores" };

type Props = { params: Promise<{ screeningId: string }>; searchParams: Promise<{ rev?: string | string[] }> };

export default async function WindowPage({ params, searchParams }: Props) {
  const viewer = await requireViewer();
  const [{ screeningId }, { rev }] = await Promise.all([params, searchParams]);
  const screening = await getScreening(viewer, screeningId, revisionAsked(rev));
  if (!screening) notFound();
  const titleBlock = <RecordTitleBlock screening={screening} />;
  const back = <ButtonLink href={pages.screening(screeningId, revisionAsked(rev))}>Back to the sheet</ButtonLink>;
  const found = screening.prepared && sizingOf(screening.prepared);
  if (!screening.prepared || !found) {
    return (
      <SheetWithMargin titleBlock={titleBlock} margin={null}>
        <EmptyState title="No bore to look for yet" action={back}>
          Compute a case with an orifice first. A fire case tells which bores are too small, a cold case with a rated steel which
          are too large.
        </EmptyState>
      </SheetWithMargin>
    );
  }
  return (
    <SitePressure barometricPressurePa={screening.prepared.content.barometricPressurePa}>
      <WindowSheet sizing={found.sizing} names={found.names} titleBlock={titleBlock} back={back} />
    </SitePressure>
  );
}

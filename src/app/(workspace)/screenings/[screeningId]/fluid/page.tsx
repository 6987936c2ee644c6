import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { SitePressure } from "@/components/units/units-provider";
import { equationTitles } from "@/contracts/equation-titles";
import { pages } from "@/contracts/paths";
import { changeOfFluid, changeToText } from "@/features/fluid/change/change-input";
import { fluidOfScreening } from "@/features/fluid/sheet/fluid-of-screening";
import { FluidSheet } from "@/features/fluid/sheet/fluid-sheet";
import { NoFluid } from "@/features/fluid/sheet/no-fluid";
import { RecordTitleBlock } from "@/features/screening/results/record-title-block";
import { requireViewer, viewerView } from "@/server/auth/viewer";
import { getFacility } from "@/server/facilities/read";
import { getScreening } from "@/server/screenings/read";
import { revisionAsked } from "../revision-asked";

export const metadata: Metadata = { title: "Fluid" };

type Props = { params: Promise<{ screeningId: string }>; searchParams: Promise<{ rev?: string | string[] }> };

export default async function FluidPage({ params, searchParams }: Props) {
  const viewer = await requireViewer();
  const [{ screeningId }, { rev }] = await Promise.all([params, searchParams]);
  const screening = await getScreening(viewer, screeningId, revisionAsked(rev));
  if (!screening) notFound();
  const facility = await getFacility(viewer, screening.facility.id);
  if (!facility) notFound();

  const titleBlock = <RecordTitleBlock screening={screening} />;
  const subject = fluidOfScreening(screening);
  if (!subject) return <NoFluid titleBlock={titleBlock} back={pages.screening(screeningId)} />;
  const { units } = viewerView(viewer);
  return (
    <SitePressure barometricPressurePa={screening.prepared?.content.barometricPressurePa ?? facility.barometricPressurePa}>
      <FluidSheet
        titleBlock={titleBlock}
        subject={subject}
        equationTitle={subject.fluid ? equationTitles[subject.fluid.equation] : "None yet"}
        edits={screening.may.edit ? pages.part(screeningId, "fluid") : undefined}
        changeHref={subject.fluid && `${pages.changeOfState}#${changeToText(changeOfFluid(subject.fluid, subject.start, units))}`}
      />
    </SitePressure>
  );
}

import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { Sheet } from "@/components/shell/sheet";
import { SitePressure } from "@/components/units/units-provider";
import { DecideDesk } from "@/features/approval/decide-desk";
import { NotNow } from "@/features/approval/not-now";
import { whyNotDecide } from "@/features/approval/why-not-now";
import { AssumedTable } from "@/features/screening/results/assumed-table";
import { GoverningPanel } from "@/features/screening/results/governing-panel";
import { HoldsPanel } from "@/features/screening/results/holds-panel";
import { RecordTitleBlock } from "@/features/screening/results/record-title-block";
import { requireViewer, viewerView } from "@/server/auth/viewer";
import { methodWords } from "@/server/screenings/ceremony";
import { getScreening } from "@/server/screenings/read";

export const metadata: Metadata = { title: "Decide" };

export default async function DecidePage({ params }: { params: Promise<{ screeningId: string }> }) {
  const viewer = await requireViewer();
  const { screeningId } = await params;
  const screening = await getScreening(viewer, screeningId);
  if (!screening) notFound();
  const titleBlock = <RecordTitleBlock screening={screening} />;
  const { prepared, may, author } = screening;
  if (!may.decide || !prepared) {
    const { title, words } = whyNotDecide(screening, viewer.id);
    return (
      <NotNow screeningId={screeningId} title={title} titleBlock={titleBlock}>
        {words}
      </NotNow>
    );
  }
  return (
    <SitePressure barometricPressurePa={prepared.content.barometricPressurePa}>
      <Sheet>
        {titleBlock}
        <DecideDesk
          screeningId={screeningId}
          prepared={prepared}
          author={author.badge}
          viewer={viewerView(viewer)}
          method={methodWords()}
          assumed={<AssumedTable key="assumed" content={prepared.content} />}
          governs={<GoverningPanel key="governs" prepared={prepared} />}
          holds={<HoldsPanel key="holds" prepared={prepared} />}
        />
      </Sheet>
    </SitePressure>
  );
}

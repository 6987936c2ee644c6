import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { Sheet } from "@/components/shell/sheet";
import { SitePressure } from "@/components/units/units-provider";
import { NotNow } from "@/features/approval/not-now";
import { SignDesk } from "@/features/approval/sign-desk";
import { whyNotSign } from "@/features/approval/why-not-now";
import { AssumedTable } from "@/features/screening/results/assumed-table";
import { HoldsPanel } from "@/features/screening/results/holds-panel";
import { RecordTitleBlock } from "@/features/screening/results/record-title-block";
import { requireViewer, viewerView } from "@/server/auth/viewer";
import { blockersOf } from "@/server/screenings/blockers";
import { methodWords } from "@/server/screenings/ceremony";
import { getScreening } from "@/server/screenings/read";

export const metadata: Metadata = { title: "Review and sign" };

export default async function SignPage({ params }: { params: Promise<{ screeningId: string }> }) {
  const viewer = await requireViewer();
  const { screeningId } = await params;
  const screening = await getScreening(viewer, screeningId);
  if (!screening) notFound();
  const titleBlock = <RecordTitleBlock screening={screening} />;
  const { prepared, may } = screening;
  if (!may.sign || !prepared) {
    const { title, words } = whyNotSign(screening);
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
        <SignDesk
          screeningId={screeningId}
          prepared={prepared}
          blockers={blockersOf(prepared.content)}
          viewer={viewerView(viewer)}
          method={methodWords()}
        >
          <HoldsPanel prepared={prepared} />
          <h2 className="mb-1 mt-6">What is assumed</h2>
          <AssumedTable content={prepared.content} />
        </SignDesk>
      </Sheet>
    </SitePressure>
  );
}

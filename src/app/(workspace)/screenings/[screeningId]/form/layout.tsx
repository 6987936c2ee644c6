import { notFound, redirect } from "next/navigation";
import type { ReactNode } from "react";
import { pages } from "@/contracts/paths";
import { DraftProvider } from "@/features/screening/form/draft-provider";
import { requireViewer } from "@/server/auth/viewer";
import { getFacility } from "@/server/facilities/read";
import { getScreening } from "@/server/screenings/read";

/** Holds the draft while one goes from part to part. A revision that is signed has no lines to change: its sheet is shown instead. */
export default async function FormLayout({
  children,
  params,
}: {
  children: ReactNode;
  params: Promise<{ screeningId: string }>;
}) {
  const viewer = await requireViewer();
  const { screeningId } = await params;
  const screening = await getScreening(viewer, screeningId);
  if (!screening) notFound();
  if (!screening.draft) redirect(pages.screening(screeningId));
  const facility = await getFacility(viewer, screening.facility.id);
  if (!facility) notFound();

  return (
    <DraftProvider
      subject={{
        screeningId,
        record: screening.record,
        section: screening.section,
        facility: { id: facility.id, name: facility.name, demo: facility.demo },
        author: screening.author.badge,
        site: { barometricPressurePa: facility.barometricPressurePa, policy: facility.policy },
      }}
      start={screening.draft}
    >
      {children}
    </DraftProvider>
  );
}

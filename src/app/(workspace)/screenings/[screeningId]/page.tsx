import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { ButtonLink } from "@/components/button/button-link";
import { pages } from "@/contracts/paths";
import { WithdrawButton } from "@/features/approval/withdraw-button";
import { ScreeningSheet } from "@/features/screening/results/screening-sheet";
import { requireViewer } from "@/server/auth/viewer";
import { getScreening } from "@/server/screenings/read";
import { revisionAsked } from "./revision-asked";

export const metadata: Metadata = { title: "Screening" };

type Props = { params: Promise<{ screeningId: string }>; searchParams: Promise<{ rev?: string | string[] }> };

export default async function ScreeningPage({ params, searchParams }: Props) {
  const viewer = await requireViewer();
  const [{ screeningId }, { rev }] = await Promise.all([params, searchParams]);
  const screening = await getScreening(viewer, screeningId, revisionAsked(rev));
  if (!screening) notFound();
  const { prepared, may, rev: shown, revisions } = screening;
  const acts = (
    <>
      <ButtonLink href={pages.fluid(screening.id, shown === revisions[0]?.rev ? undefined : shown)}>Fluid</ButtonLink>
      {may.withdraw && prepared && <WithdrawButton screeningId={screening.id} prepared={prepared} />}
    </>
  );
  return <ScreeningSheet screening={screening} acts={acts} />;
}

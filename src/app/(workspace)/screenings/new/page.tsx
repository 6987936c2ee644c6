import type { Metadata } from "next";
import { StartScreening } from "@/features/screening/form/start-screening";
import { requireViewer } from "@/server/auth/viewer";
import { listFacilities } from "@/server/facilities/read";
import { listSections } from "@/server/sections/read";

export const metadata: Metadata = { title: "New screening" };

export default async function NewScreeningPage({ searchParams }: { searchParams: Promise<{ section?: string }> }) {
  const viewer = await requireViewer();
  const [sections, facilities] = await Promise.all([listSections(viewer), listFacilities(viewer)]);
  return (
    <StartScreening
      sections={sections}
      facilities={facilities.map(({ id, name }) => ({ id, name }))}
      chosen={(await searchParams).section ?? ""}
      mayStart={viewer.role === "engineer"}
    />
  );
}

import type { Metadata } from "next";
import { PageHead } from "@/components/shell/page-head";
import { Sheet, SheetBody } from "@/components/shell/sheet";
import { EmptyState } from "@/components/states/empty-state";
import { FacilityTable } from "@/features/facility/facility-table";
import { NewFacilityButton } from "@/features/facility/new-facility-button";
import { requireViewer } from "@/server/auth/viewer";
import { listFacilities } from "@/server/facilities/read";

export const metadata: Metadata = { title: "Facilities" };

export default async function FacilitiesPage() {
  const viewer = await requireViewer();
  const facilities = await listFacilities(viewer);
  const administers = viewer.role === "administrator";
  return (
    <Sheet>
      <SheetBody>
        <PageHead title="Facilities">{administers && <NewFacilityButton />}</PageHead>
        {facilities.length > 0 ? (
          <FacilityTable facilities={facilities} />
        ) : (
          <EmptyState title={administers ? "No facility yet." : "You belong to no facility yet."}>
            {administers
              ? "A facility holds sections and says what screenings are held against."
              : "An administrator can add you to one."}
          </EmptyState>
        )}
      </SheetBody>
    </Sheet>
  );
}

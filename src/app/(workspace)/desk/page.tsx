import type { Metadata } from "next";
import { AdministratorDesk } from "@/features/desk/administrator-desk";
import { ApproverDesk } from "@/features/desk/approver-desk";
import { AuditorDesk } from "@/features/desk/auditor-desk";
import { EngineerDesk } from "@/features/desk/engineer-desk";
import { NoScreenings } from "@/features/screening/list/no-screenings";
import { ScreeningTable } from "@/features/screening/list/screening-table";
import { requireViewer } from "@/server/auth/viewer";
import { getDesk } from "@/server/desk/read";
import { listFacilities } from "@/server/facilities/read";
import { listPeople } from "@/server/people/read";

export const metadata: Metadata = { title: "Desk" };

export default async function DeskPage() {
  const viewer = await requireViewer();
  const desk = await getDesk(viewer);
  const now = new Date().toISOString();
  const table = (caption: string, none: string) =>
    desk.yours.length > 0 ? (
      <ScreeningTable rows={desk.yours} caption={caption} now={now} />
    ) : (
      <p className="border-t py-3.5 font-serif text-prose text-ink-2">{none}</p>
    );

  switch (viewer.role) {
    case "approver":
      return (
        <ApproverDesk desk={desk} now={now}>
          {table("Settled by you", "You have decided no record yet.")}
        </ApproverDesk>
      );
    case "auditor":
      return (
        <AuditorDesk desk={desk} now={now}>
          {table("Signed records", "No record is signed yet.")}
        </AuditorDesk>
      );
    case "administrator": {
      const [people, facilities] = await Promise.all([listPeople(viewer), listFacilities(viewer)]);
      return <AdministratorDesk desk={desk} people={people} facilities={facilities} now={now} />;
    }
    default:
      return (
        <EngineerDesk desk={desk} now={now}>
          {desk.yours.length > 0 ? (
            <ScreeningTable rows={desk.yours} caption="Your screenings" now={now} />
          ) : (
            <NoScreenings mayCreate />
          )}
        </EngineerDesk>
      );
  }
}

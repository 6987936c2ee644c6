import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { MarginHead, MarginNote } from "@/components/shell/margin";
import { PageHead } from "@/components/shell/page-head";
import { SheetWithMargin } from "@/components/shell/sheet";
import { TitleBlock } from "@/components/shell/title-block";
import { Members } from "@/features/facility/members";
import { PolicyTable } from "@/features/facility/policy-table";
import { requireViewer } from "@/server/auth/viewer";
import { getFacility } from "@/server/facilities/read";
import { listPeople } from "@/server/people/read";

export const metadata: Metadata = { title: "Facility" };

export default async function FacilityPage({ params }: { params: Promise<{ facilityId: string }> }) {
  const viewer = await requireViewer();
  const facility = await getFacility(viewer, (await params).facilityId);
  if (!facility) notFound();
  const people = viewer.role === "administrator" ? { people: await listPeople(viewer) } : {};
  return (
    <SheetWithMargin
      titleBlock={
        <TitleBlock
          cells={[
            { label: "Facility", value: `${facility.name}${facility.demo ? ", demo" : ""}`, wide: true },
            { label: "Code", value: facility.code },
            { label: "Sections", value: facility.sections },
            { label: "Policy", value: `${facility.policy.name} rev ${facility.policy.rev}` },
          ]}
        />
      }
      margin={
        <>
          <MarginHead>In the margin</MarginHead>
          {facility.demo && <MarginNote no="Demo">Plant, people and figures of this facility are invented.</MarginNote>}
          <MarginNote no="Policy">
            Target time and pressure are common practice for depressuring, after API Std 521. The site’s own basis governs, and
            each screening may set its own limits with a source.
          </MarginNote>
        </>
      }
    >
      <PageHead title={facility.name} />
      <h2 className="mb-1">
        Limit policy {facility.policy.name} rev {facility.policy.rev}
      </h2>
      <PolicyTable facility={facility} />
      <div className="mt-8">
        <Members facility={facility} {...people} />
      </div>
    </SheetWithMargin>
  );
}

import type { Metadata } from "next";
import { MarginHead, MarginNote } from "@/components/shell/margin";
import { PageHead } from "@/components/shell/page-head";
import { SheetWithMargin } from "@/components/shell/sheet";
import { InviteButton } from "@/features/people/invite-button";
import { PeopleTable } from "@/features/people/people-table";
import { PersonPanel } from "@/features/people/person-panel";
import { requireViewer } from "@/server/auth/viewer";
import { listFacilities } from "@/server/facilities/read";
import { listPeople } from "@/server/people/read";
import { allowed } from "../allowed";
import { NotForRole } from "../not-for-role";
import type { SearchParams } from "../query";

export const metadata: Metadata = { title: "People" };

export default async function PeoplePage({ searchParams }: { searchParams: Promise<SearchParams> }) {
  const viewer = await requireViewer();
  const read = await allowed(Promise.all([listPeople(viewer), listFacilities(viewer)]));
  if (!read) return <NotForRole viewer={viewer} what="People" who={["administrator"]} />;
  const [people, facilities] = read.found;
  const asked = (await searchParams).person;
  const chosen = people.find(({ id }) => id === asked && id !== viewer.id);
  const administrators = people.filter(({ role, active }) => role === "administrator" && active).length;

  return (
    <SheetWithMargin
      wideMargin
      marginLabel={chosen ? `Account of ${chosen.badge}` : "Rules that hold"}
      margin={
        chosen ? (
          <PersonPanel key={chosen.id} person={chosen} takesTwo={administrators >= 2} />
        ) : (
          <>
            <MarginHead>Rules that hold</MarginHead>
            <MarginNote>Disabling an account never removes its signatures. A badge is never used again.</MarginNote>
            <MarginNote>Each change to a person is a log entry. You can’t change your own account.</MarginNote>
            <MarginNote>
              {administrators >= 2
                ? "A change of role takes two administrators."
                : "There is one administrator, so a change of role takes effect at once, and its entries say so. From two on it takes both."}
            </MarginNote>
          </>
        )
      }
    >
      <PageHead title="People">
        <InviteButton facilities={facilities} />
      </PageHead>
      <p className="-mt-3 mb-3 font-serif text-prose text-ink-3">
        One role each. Administrators see no screening content and sign nothing.
      </p>
      <PeopleTable people={people} viewerId={viewer.id} chosen={chosen?.id ?? null} now={new Date().toISOString()} />
    </SheetWithMargin>
  );
}

import Link from "next/link";
import { ButtonLink } from "@/components/button/button-link";
import { formatUtc } from "@/components/quantity/format-time";
import { MarginHead, MarginNote } from "@/components/shell/margin";
import { PageHead } from "@/components/shell/page-head";
import { SheetWithMargin } from "@/components/shell/sheet";
import { FactTable } from "@/components/table/table";
import { pages } from "@/contracts/paths";
import { roleWords } from "@/contracts/roles";
import type { DeskView, FacilityView, PersonDetailView } from "@/contracts/views";
import { longDate } from "./long-date";

type Props = { desk: DeskView; people: readonly PersonDetailView[]; facilities: readonly FacilityView[]; now: string };

/** An administrator's first page: proposals that wait for a second administrator, people who can't work yet, and the size of things. */
export function AdministratorDesk({ desk, people, facilities, now }: Props) {
  const waits = whatWaits(people);
  const active = people.filter((person) => person.active).length;
  return (
    <SheetWithMargin
      margin={
        <>
          <MarginHead>Rules that hold</MarginHead>
          <MarginNote>Administrators see no screening content and sign nothing.</MarginNote>
          <MarginNote>Disabling an account never removes its signatures. A badge is never used again.</MarginNote>
          <MarginNote>Each change to a person is a log entry. You can’t change your own account.</MarginNote>
        </>
      }
    >
      <PageHead title={`Desk, ${longDate(now)}`}>
        <ButtonLink kind="main" href={pages.people}>
          People
        </ButtonLink>
        <ButtonLink href={pages.facilities}>Facilities</ButtonLink>
      </PageHead>
      <h2 className="mb-2">
        Waits on you <span className="text-body text-ink-3">{waits.length}</span>
      </h2>
      {waits.length > 0 ? (
        <ul className="border-t">
          {waits.map(({ person, why }) => (
            <li key={person.id} className="flex flex-wrap items-center justify-between gap-3 border-b py-[13px]">
              <span>
                <b>{person.badge}</b> <span className="font-serif text-prose text-ink-2">{why}</span>
              </span>
              <ButtonLink href={`${pages.people}?person=${person.id}`}>Open</ButtonLink>
            </li>
          ))}
        </ul>
      ) : (
        <p className="border-y py-3.5 font-serif text-prose text-ink-2">Nothing waits on you.</p>
      )}
      <h2 className="mb-1 mt-[34px]">This installation</h2>
      <FactTable
        settled
        caption="This installation"
        facts={[
          { label: "People", value: <Link href={pages.people}>{`${active} active of ${people.length}`}</Link> },
          { label: "Facilities", value: <Link href={pages.facilities}>{facilities.length}</Link> },
          {
            label: "Log",
            value: desk.log.lastAt ? (
              <Link href={pages.log}>{`${desk.log.size} entries, newest ${formatUtc(desk.log.lastAt, now)} UTC`}</Link>
            ) : (
              "no entry yet"
            ),
          },
        ]}
      />
    </SheetWithMargin>
  );
}

function whatWaits(people: readonly PersonDetailView[]): { person: PersonDetailView; why: string }[] {
  return people.flatMap((person) => {
    const { proposedRole, active, role, facilities } = person;
    if (proposedRole && !proposedRole.mine)
      return [{ person, why: `A change of role to ${roleWords[proposedRole.role]} waits for a second administrator.` }];
    const needsFacility = role === "engineer" || role === "approver";
    return active && needsFacility && facilities.length === 0
      ? [{ person, why: `${roleWords[role]} without a facility: can open nothing yet.` }]
      : [];
  });
}

import Link from "next/link";
import { formatUtc } from "@/components/quantity/format-time";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import { pages } from "@/contracts/paths";
import { roleWords } from "@/contracts/roles";
import type { PersonDetailView } from "@/contracts/views";

type Props = { people: readonly PersonDetailView[]; viewerId: string; chosen: string | null; now: string };

/** Everybody who was ever enrolled, by badge. */
export function PeopleTable({ people, viewerId, chosen, now }: Props) {
  return (
    <Table caption="People">
      <thead>
        <tr>
          <HeadCell>Badge</HeadCell>
          <HeadCell>Printed name</HeadCell>
          <HeadCell>Role</HeadCell>
          <HeadCell>Facilities</HeadCell>
          <HeadCell numeric>Last signed in, UTC</HeadCell>
          <HeadCell />
        </tr>
      </thead>
      <tbody>
        {people.map((person) => (
          <Row key={person.id} chosen={person.id === chosen}>
            <Cell strong unbroken>
              {person.badge}
            </Cell>
            <Cell>{person.printedName}</Cell>
            <Cell label="Role">
              {roleWords[person.role]}
              {!person.active && <span className="text-ink-3">, disabled</span>}
              {person.proposedRole && (
                <span className="block text-small text-near">to {roleWords[person.proposedRole.role]}, half done</span>
              )}
              {person.mustChangePassword && person.active && (
                <span className="block text-small text-ink-3">still on the first password</span>
              )}
            </Cell>
            <Cell label="Facilities">{facilityWords(person)}</Cell>
            <Cell numeric label="Last signed in, UTC">
              {person.lastSignIn ? formatUtc(person.lastSignIn, now) : "never"}
            </Cell>
            <Cell>
              {person.id === viewerId ? (
                <span className="text-small text-ink-3">yourself</span>
              ) : (
                <Link href={`${pages.people}?person=${person.id}`} scroll={false} aria-label={`Change ${person.badge}`}>
                  Change
                </Link>
              )}
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

function facilityWords({ role, facilities }: PersonDetailView): string {
  if (role === "auditor") return "all, reading only";
  if (role === "administrator") return "–";
  return facilities.map(({ name }) => name).join(", ") || "none yet";
}

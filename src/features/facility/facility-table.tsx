import Link from "next/link";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import { pages } from "@/contracts/paths";
import type { FacilityView } from "@/contracts/views";

export function FacilityTable({ facilities }: { facilities: readonly FacilityView[] }) {
  return (
    <Table caption="Facilities">
      <thead>
        <tr>
          <HeadCell>Facility</HeadCell>
          <HeadCell>Code</HeadCell>
          <HeadCell>Limit policy</HeadCell>
          <HeadCell numeric>Sections</HeadCell>
          <HeadCell numeric>Members</HeadCell>
        </tr>
      </thead>
      <tbody>
        {facilities.map(({ id, name, code, demo, policy, sections, members }) => (
          <Row key={id}>
            <Cell strong wholeRow>
              <Link href={pages.facility(id)}>{name}</Link>
              {demo && <span className="font-normal text-ink-3"> demo, invented</span>}
            </Cell>
            <Cell label="Code">{code}</Cell>
            <Cell label="Limit policy">
              {policy.name} rev {policy.rev}
            </Cell>
            <Cell numeric label="Sections">
              {sections}
            </Cell>
            <Cell numeric label="Members">
              {members.length}
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

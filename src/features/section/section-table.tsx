import Link from "next/link";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import { pages } from "@/contracts/paths";
import type { SectionView } from "@/contracts/views";

/** Isolatable sections of one facility. */
export function SectionTable({ sections, caption }: { sections: readonly SectionView[]; caption: string }) {
  return (
    <Table caption={caption}>
      <thead>
        <tr>
          <HeadCell>Section</HeadCell>
          <HeadCell>Name</HeadCell>
          <HeadCell>What it holds</HeadCell>
        </tr>
      </thead>
      <tbody>
        {sections.map(({ id, tag, name, description }) => (
          <Row key={id}>
            <Cell strong unbroken>
              <Link href={pages.section(id)}>{tag}</Link>
            </Cell>
            <Cell>{name}</Cell>
            <Cell wholeRow>
              <span className="font-serif text-ink-2">{description || "–"}</span>
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

import Link from "next/link";
import { pages } from "@/contracts/paths";
import { partOfLine } from "./line-words";

/** The number of a line; leads to it on the form where the form can be edited. */
export function LineLink({ line, edits }: { line: string; edits?: string }) {
  const part = partOfLine(line);
  return edits && part ? (
    <Link href={pages.part(edits, part.slug, line)} className="line-no !text-tide">
      {line}
    </Link>
  ) : (
    <span className="line-no">{line}</span>
  );
}

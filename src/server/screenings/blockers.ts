import "server-only";
import type { RecordContent } from "@/contracts/record-content";
import { parseLineKey } from "@/contracts/lines/registry";

/** What keeps a computed record from being signed: values nobody has given a source for. An assumed value has one, its reason. */
export function blockersOf(record: Pick<RecordContent, "lines" | "compositionSource">): { path: string; message: string }[] {
  const lines = record.lines.flatMap(({ line, label, source }) => {
    const known = parseLineKey(line)?.line;
    if (known?.kind !== "quantity" || known.sourceFree || source?.note.trim()) return [];
    return [
      { path: line, message: `${label} has no source. Say where the value comes from, or mark it as assumed with the reason.` },
    ];
  });
  const composition = record.compositionSource?.note.trim()
    ? []
    : [
        {
          path: "3.01",
          message: "The composition has no source. Name the report it comes from, or mark it as assumed with the reason.",
        },
      ];
  return [...lines, ...composition];
}

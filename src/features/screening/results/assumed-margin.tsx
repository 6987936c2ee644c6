"use client";

import { MarginHead, MarginNote } from "@/components/shell/margin";
import { SourceMark } from "@/components/line/source-mark";
import type { RecordContent } from "@/contracts/record-content";
import { lineWords } from "./line-words";
import { useShowing } from "./use-showing";

/** What rests on assumption, line by line with the reason given, under the caution that says how many. */
export function AssumedMargin({ content }: { content: RecordContent }) {
  const showing = useShowing();
  const caution = content.cautions.find(({ id }) => id === "C6");
  return (
    <div id="assumed">
      <MarginHead>{content.assumed.length === 1 ? "Assumed, 1 line" : `Assumed, ${content.assumed.length} lines`}</MarginHead>
      {caution && (
        <MarginNote no={caution.id} caution>
          {caution.words}
        </MarginNote>
      )}
      {content.assumed.length === 0 && <MarginNote>Every value has a source that is not an assumption.</MarginNote>}
      {content.assumed.map((key) => {
        const line = content.lines.find((one) => one.line === key);
        const note = line ? line.source?.note : content.compositionSource?.note;
        return (
          <MarginNote key={key} no={key} mark={<SourceMark kind="assumed" titled />}>
            {line ? `${line.label}: ${lineWords(line, showing).value}` : "Composition"}
            {note ? `, ${note}` : ""}.
          </MarginNote>
        );
      })}
    </div>
  );
}

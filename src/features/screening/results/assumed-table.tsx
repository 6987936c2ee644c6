"use client";

import { SourceMark } from "@/components/line/source-mark";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import type { RecordContent } from "@/contracts/record-content";
import { lineWords } from "./line-words";
import { useShowing } from "./use-showing";

/** Every assumed line with its value and the reason given for it. */
export function AssumedTable({ content }: { content: RecordContent }) {
  const showing = useShowing();
  if (content.assumed.length === 0) return <p className="border-t py-2.5 font-serif text-prose">No line rests on assumption.</p>;
  return (
    <div className="phone:[&_tr]:!grid-cols-[64px_minmax(0,1fr)_auto]">
      <Table caption="Assumed lines">
        <thead>
          <tr>
            <HeadCell>Line</HeadCell>
            <HeadCell>What</HeadCell>
            <HeadCell numeric>Value</HeadCell>
            <HeadCell>Reason</HeadCell>
          </tr>
        </thead>
        <tbody>
          {content.assumed.map((key) => {
            const line = content.lines.find((one) => one.line === key);
            return (
              <Row key={key}>
                <Cell unbroken>
                  <span className="line-no">{key}</span>
                </Cell>
                <Cell>
                  <SourceMark kind="assumed" titled /> {line?.label ?? "Composition"}
                </Cell>
                <Cell numeric strong>
                  {line ? lineWords(line, showing).value : "–"}
                </Cell>
                <Cell wholeRow>
                  <span className="font-serif text-ink-2">
                    {(line ? line.source?.note : content.compositionSource?.note) ?? ""}
                  </span>
                </Cell>
              </Row>
            );
          })}
        </tbody>
      </Table>
    </div>
  );
}

"use client";

import { SourceNote } from "@/components/line/source-note";
import { formatMolePercent } from "@/components/quantity/format";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import { parts } from "@/contracts/lines/parts";
import { parseLineKey } from "@/contracts/lines/registry";
import type { RecordContent } from "@/contracts/record-content";
import { LineLink } from "./line-link";
import { lineWords } from "./line-words";
import { useShowing } from "./use-showing";

/** The same columns in every part, so that values stand under each other down the sheet. */
const columns =
  "[&_table.stack]:table-fixed [&_table.stack_th:nth-child(1)]:w-[76px] [&_table.stack_th:nth-child(2)]:w-[34%] [&_table.stack_th:nth-child(3)]:w-[24%] [&_table.stack_th:nth-child(4)]:pl-6 [&_table.stack_td:nth-child(4)]:pl-6 phone:[&_table.stack_td:nth-child(4)]:pl-0 phone:[&_table.stack_tr]:!grid-cols-[64px_minmax(0,1fr)_auto]";

/**
 * Every line the record rests on, by part, with its source.
 *
 * edits   id of the screening whose form the line numbers lead to; left out where nothing can be edited
 */
export function Inputs({ content, edits }: { content: RecordContent; edits?: string }) {
  const showing = useShowing();
  const linesOf = (part: number) => content.lines.filter(({ line }) => parseLineKey(line)?.line.part === part);
  return (
    <section>
      <h2 className="mb-1">What it rests on</h2>
      {parts.map(({ part, title }) => {
        const lines = linesOf(part);
        if (lines.length === 0 && part !== 3) return null;
        return (
          <div key={part} className={`mt-4 ${columns}`}>
            <h3>
              {part} {title}
            </h3>
            {part === 3 && <Composition content={content} />}
            {lines.length > 0 && (
              <Table caption={`Lines of part ${part}, ${title}`}>
                <thead>
                  <tr>
                    <HeadCell>Line</HeadCell>
                    <HeadCell>What</HeadCell>
                    <HeadCell numeric>Value</HeadCell>
                    <HeadCell>Source</HeadCell>
                  </tr>
                </thead>
                <tbody>
                  {lines.map((line) => {
                    const { value, typed } = lineWords(line, showing);
                    const known = parseLineKey(line.line)?.line;
                    return (
                      <Row key={line.line}>
                        <Cell>
                          <LineLink line={line.line} {...(edits ? { edits } : {})} />
                        </Cell>
                        <Cell>{line.label}</Cell>
                        <Cell numeric={line.si !== null} strong wholeRow={line.si === null}>
                          {value}
                          {typed && <span className="block text-label font-normal text-ink-3">typed {typed}</span>}
                        </Cell>
                        <Cell wholeRow>
                          {line.source ? (
                            <SourceNote kind={line.source.kind}>{line.source.note}</SourceNote>
                          ) : (
                            !known?.sourceFree && known?.kind === "quantity" && <SourceNote kind="missing" />
                          )}
                        </Cell>
                      </Row>
                    );
                  })}
                </tbody>
              </Table>
            )}
          </div>
        );
      })}
    </section>
  );
}

function Composition({ content }: { content: RecordContent }) {
  return (
    <>
      <Table caption="Composition" stack={false}>
        <thead>
          <tr>
            <HeadCell>Component</HeadCell>
            <HeadCell numeric>As reported, mol %</HeadCell>
            <HeadCell numeric>As computed, mol %</HeadCell>
          </tr>
        </thead>
        <tbody>
          {content.composition.map(({ id, name, typed, moleFraction }) => (
            <Row key={id}>
              <Cell head>{name}</Cell>
              <Cell numeric>{typed || "–"}</Cell>
              <Cell numeric>{formatMolePercent(moleFraction)}</Cell>
            </Row>
          ))}
        </tbody>
      </Table>
      <div className="py-2">
        {content.compositionSource ? (
          <SourceNote kind={content.compositionSource.kind}>{content.compositionSource.note}</SourceNote>
        ) : (
          <SourceNote kind="missing">of the composition</SourceNote>
        )}
      </div>
    </>
  );
}

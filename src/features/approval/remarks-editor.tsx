"use client";

import { Button } from "@/components/button/button";
import { TextArea } from "@/components/line/text-area";
import { TextField } from "@/components/line/text-field";
import type { RecordContent } from "@/contracts/record-content";
import { citedLine, labelOfLine } from "./cited-line";
import type { RemarkDraft } from "./decision";

type Props = {
  content: RecordContent;
  remarks: readonly RemarkDraft[];
  onChange: (remarks: RemarkDraft[]) => void;
  disabled: boolean;
};

/** Remarks, each tied to a line: its number, what the line is called, the words. */
export function RemarksEditor({ content, remarks, onChange, disabled }: Props) {
  const change = (key: number, fields: Partial<RemarkDraft>) =>
    onChange(remarks.map((one) => (one.key === key ? { ...one, ...fields } : one)));
  const add = () => onChange([...remarks, { key: Math.max(-1, ...remarks.map(({ key }) => key)) + 1, line: "", text: "" }]);

  return (
    <section aria-label="Remarks" className="mt-[18px]">
      <h3 className="mb-1.5">
        Remarks <span className="font-normal text-ink-3">each tied to a line</span>
      </h3>
      {remarks.length === 0 && (
        <p className="border-t border-rule-2 py-2 font-serif text-prose">No remarks. A return needs at least one.</p>
      )}
      {remarks.map(({ key, line, text }, index) => {
        const cited = citedLine(line, content);
        const words =
          line.trim() === ""
            ? "number of the line"
            : cited
              ? `${cited} ${labelOfLine(cited, content)}`
              : `There is no line ${line.trim()}.`;
        return (
          <div key={key} role="group" aria-label={`Remark ${index + 1}`} className="border-t border-rule-2 py-2">
            <div className="mb-1.5 flex items-center gap-2.5">
              <span className="w-[110px] flex-none">
                <TextField
                  label={`Line of remark ${index + 1}`}
                  value={line}
                  tone={line.trim() !== "" && !cited ? "bad" : "rest"}
                  placeholder="4.03"
                  disabled={disabled}
                  aria-describedby={`remark-line-${key}`}
                  onValueChange={(value) => change(key, { line: value })}
                />
              </span>
              <span
                id={`remark-line-${key}`}
                className={`flex-1 text-small ${line.trim() !== "" && !cited ? "text-beyond" : "text-ink-3"}`}
              >
                {words}
              </span>
              <Button
                kind="quiet"
                aria-label={`Remove remark ${index + 1}`}
                onClick={() => onChange(remarks.filter((one) => one.key !== key))}
              >
                Remove
              </Button>
            </div>
            <TextArea
              label={`Words of remark ${index + 1}`}
              value={text}
              maxLength={1200}
              disabled={disabled}
              onValueChange={(value) => change(key, { text: value })}
            />
          </div>
        );
      })}
      <Button kind="quiet" onClick={add}>
        Add a remark
      </Button>
    </section>
  );
}

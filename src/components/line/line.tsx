"use client";

import { useMemo, type ReactNode } from "react";
import { LineContext, type LineTone } from "./line-context";
import { WarningSign } from "./warning-sign";

export type LineMessage = { tone: "warn" | "bad"; text: ReactNode };

/**
 * One row of the form: number, label, field, source. The only form row there is.
 *
 * no         as cited ("4.03", "A5.02"); the row's anchor is `line-<no>`, its field's id `value-<no>`
 * hint       small type under the label
 * other      the value in the other system of units, small under the label
 * changed    what the line said in the revision before ("31.8 mm in rev 1")
 * children   the field
 * source     a `<SourceNote />`, or nothing where no source is asked for
 * message    what is wrong, why we think so, what to do; read with the field
 * tone       `derived` for computed lines, `locked` once signed; a message sets `warn` or `bad` by itself
 * across     the field takes the whole width under the label, and no source is asked for
 * wide       the field takes the source's column as well, for words where no source is asked for
 * group      the field is several controls (radios): the label names the group instead of pointing at one control
 */
export function Line({
  no,
  label,
  hint,
  other,
  changed,
  children,
  source,
  message,
  tone = "rest",
  group = false,
  across = false,
  wide = false,
}: {
  no: string;
  label: string;
  hint?: ReactNode;
  other?: ReactNode;
  changed?: ReactNode;
  children: ReactNode;
  source?: ReactNode;
  message?: LineMessage;
  tone?: LineTone;
  group?: boolean;
  across?: boolean;
  wide?: boolean;
}) {
  const valueId = `value-${no}`;
  const labelId = `label-${no}`;
  const hintId = hint || changed ? `hint-${no}` : undefined;
  const messageId = message ? `message-${no}` : undefined;
  const describedBy = [messageId, hintId].filter(Boolean).join(" ") || undefined;
  const shownTone = message?.tone ?? tone;
  const ids = useMemo(
    () => ({ valueId, labelId, label, describedBy, tone: shownTone }),
    [valueId, labelId, label, describedBy, shownTone],
  );
  const Label = group ? "span" : "label";

  return (
    <LineContext.Provider value={ids}>
      <div
        id={`line-${no}`}
        className="unbroken grid min-h-line scroll-mt-16 grid-cols-[46px_minmax(150px,1.15fr)_214px_minmax(170px,1fr)] items-center gap-x-3.5 border-b py-1 phone:grid-cols-[48px_minmax(0,1fr)] phone:gap-x-2 phone:gap-y-1 phone:py-2.5"
      >
        <span className="line-no pt-0.5 phone:self-start">{no}</span>
        <div className="min-w-0">
          <Label id={labelId} {...(group ? {} : { htmlFor: valueId })}>
            {label}
          </Label>
          {(hint || changed) && (
            <small id={hintId} className="block text-label text-ink-3">
              {hint}
              {hint && changed && " · "}
              {changed}
            </small>
          )}
          {other && <small className="block text-label text-ink-3">{other}</small>}
        </div>
        <div
          className={`min-w-0 ${across ? "col-span-full border-t" : wide ? "col-span-2 phone:col-span-1 phone:col-start-2" : "phone:col-start-2"}`}
        >
          {children}
        </div>
        {!across && !wide && <div className="min-w-0 phone:col-start-2">{source}</div>}
        {message && (
          <p
            id={messageId}
            className={`col-[2/-1] flex items-baseline gap-2 pb-[5px] pt-[3px] text-note leading-[1.4] phone:col-start-2 ${
              message.tone === "bad" ? "text-beyond" : "text-near"
            }`}
          >
            <span className="relative top-0.5">
              <WarningSign />
            </span>
            <span>{message.text}</span>
          </p>
        )}
      </div>
    </LineContext.Provider>
  );
}

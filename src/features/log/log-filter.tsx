import Form from "next/form";
import type { ReactNode } from "react";
import { Button } from "@/components/button/button";
import { ButtonLink } from "@/components/button/button-link";
import { Chevron } from "@/components/line/chevron";
import { pages } from "@/contracts/paths";
import type { LogFilter } from "@/contracts/requests";
import { entryKinds } from "@/ledger/entry-kinds";

/** Narrows the log by its address: record, who, what, from and to (UTC days, both counted). */
export function LogFilterForm({ filter }: { filter: Partial<LogFilter> }) {
  const { record = "", badge = "", kind = "", from = "", to = "" } = filter;
  const filtered = [record, badge, kind, from, to].some((value) => value !== "");
  return (
    <Form
      key={[record, badge, kind, from, to].join("|")}
      action={pages.log}
      className="mb-1 flex flex-wrap items-end gap-2.5 border-b border-rule-2 pb-3.5"
    >
      <Labelled id="filter-record" label="Record">
        <input
          id="filter-record"
          name="record"
          defaultValue={record}
          maxLength={20}
          placeholder="SC-0001"
          size={9}
          className="field-value words"
        />
      </Labelled>
      <Labelled id="filter-badge" label="By">
        <input
          id="filter-badge"
          name="badge"
          defaultValue={badge}
          maxLength={12}
          placeholder="anyone"
          size={8}
          className="field-value words"
        />
      </Labelled>
      <Labelled id="filter-kind" label="What">
        <select id="filter-kind" name="kind" defaultValue={kind} className="field-value words w-[190px] !pr-7 phone:w-auto">
          <option value="">anything</option>
          {Object.entries(entryKinds).map(([value, { words }]) => (
            <option key={value} value={value}>
              {words}
            </option>
          ))}
        </select>
        <Chevron />
      </Labelled>
      <Labelled id="filter-from" label="From">
        <input id="filter-from" name="from" type="date" defaultValue={from} className="field-value words" />
      </Labelled>
      <Labelled id="filter-to" label="To">
        <input id="filter-to" name="to" type="date" defaultValue={to} className="field-value words" />
      </Labelled>
      <Button type="submit">Show</Button>
      {filtered && (
        <ButtonLink kind="quiet" href={pages.log}>
          Clear filters
        </ButtonLink>
      )}
    </Form>
  );
}

function Labelled({ id, label, children }: { id: string; label: string; children: ReactNode }) {
  return (
    <div className="grid gap-1 phone:flex-[1_0_45%]">
      <label htmlFor={id} className="text-label text-ink-3">
        {label}
      </label>
      <span className="field-box relative">{children}</span>
    </div>
  );
}

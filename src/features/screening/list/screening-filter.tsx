import Form from "next/form";
import { Button } from "@/components/button/button";
import { ButtonLink } from "@/components/button/button-link";
import { Chevron } from "@/components/line/chevron";
import { pages } from "@/contracts/paths";
import type { ScreeningFilter } from "@/contracts/requests";
import { revisionStates, type RevisionState, type SectionView } from "@/contracts/views";

const stateWords: Record<RevisionState, string> = {
  draft: "In draft",
  computed: "Computed",
  signed: "Signed, awaiting countersign",
  countersigned: "Countersigned",
  returned: "Returned with remarks",
  superseded: "Superseded",
  withdrawn: "Withdrawn",
};

/** Narrows the list by its address, so that a filtered list can be kept and sent on. */
export function ScreeningFilterForm({
  filter,
  sections,
}: {
  filter: Partial<ScreeningFilter>;
  sections: readonly SectionView[];
}) {
  const { text = "", state = "", sectionId = "" } = filter;
  return (
    <Form
      key={`${text}|${state}|${sectionId}`}
      action={pages.screenings}
      className="mb-1 flex flex-wrap items-end gap-2.5 border-b border-rule-2 pb-3.5"
    >
      <div className="grid gap-1 phone:flex-[1_0_100%]">
        <label htmlFor="filter-text" className="text-label text-ink-3">
          Record, title or section
        </label>
        <span className="field-box">
          <input id="filter-text" name="text" type="search" maxLength={80} defaultValue={text} className="field-value words" />
        </span>
      </div>
      <div className="grid gap-1 phone:flex-[1_0_45%]">
        <label htmlFor="filter-state" className="text-label text-ink-3">
          State
        </label>
        <span className="field-box relative">
          <select id="filter-state" name="state" defaultValue={state} className="field-value words !pr-7">
            <option value="">any</option>
            {revisionStates.map((one) => (
              <option key={one} value={one}>
                {stateWords[one]}
              </option>
            ))}
          </select>
          <Chevron />
        </span>
      </div>
      <div className="grid gap-1 phone:flex-[1_0_45%]">
        <label htmlFor="filter-section" className="text-label text-ink-3">
          Section
        </label>
        <span className="field-box relative">
          <select id="filter-section" name="sectionId" defaultValue={sectionId} className="field-value words !pr-7">
            <option value="">any</option>
            {sections.map(({ id, tag, name, facility }) => (
              <option key={id} value={id}>
                {facility.code} {tag} {name}
              </option>
            ))}
          </select>
          <Chevron />
        </span>
      </div>
      <Button type="submit">Show</Button>
      {(text || state || sectionId) && (
        <ButtonLink kind="quiet" href={pages.screenings}>
          Clear filters
        </ButtonLink>
      )}
    </Form>
  );
}

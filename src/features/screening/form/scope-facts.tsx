"use client";

import { FactTable } from "@/components/table/table";
import { useShown } from "@/components/quantity/quantity";
import { caseKindWords } from "@/contracts/draft";
import { useDraft } from "./draft-context";

/** What the screening belongs to; settled when it was started. */
export function ScopeFacts() {
  const { subject, draft } = useDraft();
  const shown = useShown();
  const { policy, barometricPressurePa } = subject.site;
  return (
    <FactTable
      caption="What is screened"
      facts={[
        { label: "1.01 Facility", value: `${subject.facility.name}${subject.facility.demo ? ", demo: invented" : ""}` },
        { label: "1.02 Section", value: `${subject.section.tag} ${subject.section.name}` },
        { label: "1.05 Case", value: draft.cases.map(({ letter, kind }) => `${letter} ${caseKindWords[kind]}`).join(", ") },
        { label: "Limit policy", value: `${policy.name} rev ${policy.rev}` },
        {
          label: "Barometer at the site",
          value: shown("pressure", barometricPressurePa, { unit: { SI: "kPa", US: "psia" } }).text,
        },
      ]}
    />
  );
}

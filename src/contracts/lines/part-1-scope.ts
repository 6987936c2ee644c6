import type { Line } from "./line";

export const scopeLines: Line[] = [
  {
    kind: "text",
    no: "1.03",
    part: 1,
    group: "What is screened",
    label: "Between valves",
    hint: "the valves that close the section",
    maxLength: 200,
    optional: true,
  },
  {
    kind: "choice",
    no: "1.04",
    part: 1,
    group: "What is screened",
    label: "Purpose",
    sourceFree: true,
    options: [
      { value: "first-screening", label: "First screening" },
      { value: "revalidation", label: "Revalidation" },
      { value: "change", label: "Change to plant or operation" },
      { value: "finding", label: "Answer to a finding" },
    ],
    initial: "first-screening",
  },
  { kind: "text", no: "1.10", part: 1, group: "What is screened", label: "Title on the sheet", maxLength: 120, sourceFree: true },
  {
    kind: "text",
    no: "1.11",
    part: 1,
    group: "What is screened",
    label: "Basis",
    hint: "documents and revisions this rests on",
    maxLength: 600,
    optional: true,
    sourceFree: true,
  },
];

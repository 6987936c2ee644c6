import type { FitnessVerdict } from "@/engine/eos/fitness";

/** How fit an equation is, in the words of the page. They are no verdict on a limit and carry no sign. */
export const fitnessWords: Record<FitnessVerdict, string> = {
  first: "First choice",
  fit: "Fit for screening",
  uncertain: "Uncertain here",
  "comparison-only": "For comparison only",
  "outside-range": "Outside its range",
  "not-applicable": "Does not apply",
};

/** Those whose figures count for the spread. */
export const isAdmitted = (verdict: FitnessVerdict): boolean => verdict === "first" || verdict === "fit";

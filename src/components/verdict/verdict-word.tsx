import type { ReactNode } from "react";
import { verdictInk, verdictWords, type Verdict } from "./verdict";
import { VerdictSign } from "./verdict-sign";

/** Sign and word together; `children` replace the word where it would mislead ("Not computed"). */
export function VerdictWord({ verdict, children }: { verdict: Verdict; children?: ReactNode }) {
  return (
    <span className={`whitespace-nowrap font-num font-semibold ${verdictInk[verdict]}`}>
      <VerdictSign verdict={verdict} />
      {children ?? verdictWords[verdict]}
    </span>
  );
}

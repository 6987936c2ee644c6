import type { ReactNode } from "react";
import { verdictInk, verdictWords, type Verdict } from "./verdict";
import { VerdictSign } from "./verdict-sign";

/**
 * The headline of a result: the verdict word, then a sentence that names the thing, the margin and the limit.
 *
 * figure   a `<Figure />` at the right, behind a rule
 */
export function VerdictSentence({ verdict, children, figure }: { verdict: Verdict; children: ReactNode; figure?: ReactNode }) {
  return (
    <div className="unbroken grid grid-cols-[minmax(0,1fr)_300px] items-end gap-8 pb-[18px] phone:grid-cols-1 phone:gap-3.5">
      <h1 className="max-w-[25em] text-balance text-verdict tracking-[-.01em] phone:text-[1.5rem]">
        <span className={`${verdictInk[verdict]} [&>svg]:mr-2 [&>svg]:align-[-.14em]`}>
          <VerdictSign verdict={verdict} size={30} />
          {verdictWords[verdict]}.
        </span>{" "}
        {children}
      </h1>
      {figure && (
        <div className="border-l border-rule-2 pl-[22px] phone:border-l-0 phone:border-t phone:pl-0 phone:pt-3">{figure}</div>
      )}
    </div>
  );
}

"use client";

import Link from "next/link";
import { useRouter } from "next/navigation";
import { Button } from "@/components/button/button";
import { VerdictWord } from "@/components/verdict/verdict-word";
import { caseKindWords, mostCases, type CaseKind } from "@/contracts/draft";
import { addCase, removeCase } from "@/contracts/draft-cases";
import type { PartSlug } from "@/contracts/lines/parts";
import { pages } from "@/contracts/paths";
import { useForerunState } from "../forerun/forerun-context";
import { useDraft } from "./draft-context";

/** The cases of a screening above the parts that each of them has for itself: letter, name and what the forerun found. */
export function CaseTabs({ slug }: { slug: PartSlug }) {
  const { draft, letter, cases, subject, editable, setCases } = useDraft();
  const { verdicts } = useForerunState();
  const router = useRouter();
  const here = (of: string) => pages.part(subject.screeningId, slug, undefined, of);

  const add = (kind: CaseKind) => {
    const added = addCase(draft, kind, letter);
    if (!added) return;
    setCases((before) => addCase(before, kind, letter)?.draft ?? before);
    router.push(here(added.letter));
  };
  const remove = () => {
    const left = removeCase(draft, letter);
    setCases((before) => removeCase(before, letter));
    router.push(here(left.cases[0]?.letter ?? "A"));
  };

  return (
    <div className="-mx-6 -mt-5 mb-5 border-b-1.5 border-ink bg-tint px-6 pt-2 print:hidden phone:-mx-4 phone:-mt-4 phone:px-4">
      <div className="flex flex-wrap items-end justify-between gap-x-6 gap-y-1">
        <nav aria-label="Cases" className="flex min-w-0 overflow-x-auto">
          {cases.map(({ letter: one, kind }) => {
            const verdict = verdicts[one];
            return (
              <Link
                key={one}
                href={here(one)}
                aria-current={one === letter ? "true" : undefined}
                className="grid grid-cols-[auto_auto] items-baseline gap-x-2 whitespace-nowrap border border-b-0 border-transparent px-3.5 py-2 text-ink no-underline aria-[current]:-mb-[1.5px] aria-[current]:border-1.5 aria-[current]:border-b-0 aria-[current]:border-ink aria-[current]:bg-sheet focus-visible:-outline-offset-[3px]"
              >
                <span className="font-serif text-sub font-medium">{one}</span>
                <span>{caseKindWords[kind]}</span>
                <span className="col-start-2 min-h-[20px] text-small">{verdict && <VerdictWord verdict={verdict} />}</span>
              </Link>
            );
          })}
        </nav>
        {editable && (
          <div className="flex flex-wrap gap-x-4 pb-1.5">
            {cases.length < mostCases && (
              <>
                <Button kind="quiet" onClick={() => add("fire-blowdown")}>
                  Add a fire case
                </Button>
                <Button kind="quiet" onClick={() => add("cold-blowdown")}>
                  Add a cold case
                </Button>
              </>
            )}
            {cases.length > 1 && (
              <Button kind="quiet" onClick={remove}>
                Remove case {letter}
              </Button>
            )}
          </div>
        )}
      </div>
    </div>
  );
}

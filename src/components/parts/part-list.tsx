"use client";

import Link from "next/link";
import { useEffect, useRef } from "react";
import { PartSign, type PartState } from "./part-sign";

/**
 * One part of the form.
 *
 * note   under the name: "7 of 7 settled", "1 line to fix", "1 without source"
 */
export type Part = { no: number; name: string; href: string; note: string; state: PartState; current?: boolean };

/** Parts that belong together, under a small head ("For all cases", "For case A"); the last group may go without one. */
export type PartGroup = { head?: string; parts: readonly Part[] };

const noteInk: Partial<Record<PartState, string>> = {
  "to-fix": "text-beyond font-semibold",
  "without-source": "text-near font-semibold",
};

/** The parts at the left of the form; on phones a row that scrolls inside itself, the current part in its middle. */
export function PartList({ groups, label = "Parts of the screening" }: { groups: readonly PartGroup[]; label?: string }) {
  const row = useRef<HTMLElement>(null);
  const current = useRef<HTMLAnchorElement>(null);

  useEffect(() => {
    const [list, part] = [row.current, current.current];
    if (!list || !part) return;
    // Only the row moves, never the page; where all of it is in view there is nowhere to scroll.
    const offset = part.getBoundingClientRect().left - list.getBoundingClientRect().left;
    list.scrollLeft += offset - (list.clientWidth - part.offsetWidth) / 2;
  }, [groups]);

  return (
    <nav
      ref={row}
      aria-label={label}
      className="min-w-0 border-r border-rule-2 bg-tint py-2 print:hidden phone:flex phone:overflow-x-auto phone:border-b phone:border-r-0 phone:py-0"
    >
      {groups.map((group, index) => (
        <div
          key={group.head ?? index}
          className={group.head || index === 0 ? "contents" : "mt-2 border-t border-rule-2 pt-1 phone:contents"}
        >
          {group.head && (
            <p className="px-4 pb-1.5 pt-2.5 text-label font-medium leading-none text-ink-3 phone:sr-only">{group.head}</p>
          )}
          <ol className="phone:flex">
            {group.parts.map((part) => (
              <li key={part.no}>
                <Link
                  ref={part.current ? current : undefined}
                  href={part.href}
                  aria-current={part.current ? "step" : undefined}
                  className="group grid min-h-[54px] grid-cols-[24px_1fr_16px] items-center gap-1.5 border-l-4 border-transparent py-2 pl-3 pr-3.5 text-ink-2 no-underline aria-[current]:-mr-px aria-[current]:border-tide aria-[current]:bg-sheet aria-[current]:font-semibold aria-[current]:text-ink focus-visible:-outline-offset-[3px] phone:min-h-[48px] phone:grid-cols-[18px_auto_14px] phone:whitespace-nowrap phone:border-b-4 phone:border-l-0 phone:px-3 phone:py-1.5"
                >
                  <span className="font-serif text-[1.25rem] font-medium leading-none text-ink-3">{part.no}</span>
                  <span>
                    {part.name}
                    <small
                      className={`block text-label phone:hidden phone:group-aria-[current]:block ${noteInk[part.state] ?? "font-normal text-ink-3"}`}
                    >
                      {part.note}
                    </small>
                  </span>
                  <PartSign state={part.state} />
                </Link>
              </li>
            ))}
          </ol>
        </div>
      ))}
    </nav>
  );
}

import Link from "next/link";
import type { ReactNode } from "react";
import { Mark } from "./mark";

export type MenuItem = { label: string; href: string; current?: boolean };

/**
 * The band at the top of every page: mark, words of the menu, unit switch and badge.
 *
 * menu    words for the viewer's role, in order; `current` marks the one being read
 * home    where the mark leads
 * tools   what stands at the right end, normally `<UnitSwitch />` and `<BadgeMenu />`
 */
export function Strip({ menu, home, tools }: { menu: readonly MenuItem[]; home: string; tools?: ReactNode }) {
  return (
    <header className="flex min-h-[52px] items-stretch gap-7 border-b border-rule-2 bg-sheet px-6 print:hidden phone:flex-wrap phone:gap-x-3 phone:gap-y-0 phone:px-4">
      <Link
        href={home}
        className="flex items-center gap-2.5 font-serif text-[1.25rem] font-semibold leading-none text-ink no-underline phone:min-h-[48px] phone:flex-1"
      >
        <Mark />
        <span>Ebbmark</span>
      </Link>
      <nav
        aria-label="Main"
        className="flex flex-1 gap-1 overflow-x-auto overflow-y-hidden phone:order-3 phone:-mx-4 phone:flex-[1_0_100%] phone:border-t phone:px-1.5"
      >
        {menu.map(({ label, href, current }) => (
          <Link
            key={href}
            href={href}
            aria-current={current ? "page" : undefined}
            className="flex min-h-[44px] items-center whitespace-nowrap border-b-3 border-transparent px-3 pt-[3px] text-ink-2 no-underline aria-[current]:border-ink aria-[current]:font-semibold aria-[current]:text-ink focus-visible:-outline-offset-[3px]"
          >
            {label}
          </Link>
        ))}
      </nav>
      {tools && <div className="flex items-center gap-[18px] whitespace-nowrap phone:gap-2.5">{tools}</div>}
    </header>
  );
}

import type { ReactNode } from "react";
import { Sheet } from "@/components/shell/sheet";

/**
 * The log at the left, one entry at the right. On a phone the entry takes the page, and its own links lead back.
 *
 * entry    the entry in hand, or what stands there without one
 * chosen   an entry is in hand
 */
export function LogLayout({ children, entry, chosen }: { children: ReactNode; entry: ReactNode; chosen: boolean }) {
  return (
    <Sheet>
      <div className="grid grid-cols-[minmax(0,1fr)_452px] rail:grid-cols-[minmax(0,1fr)]">
        <div className={`min-w-0 px-gutter py-6 phone:px-4 phone:py-[18px] ${chosen ? "phone:hidden" : ""}`}>{children}</div>
        <aside
          aria-label={chosen ? "Entry" : "About the log"}
          className={`border-l border-rule-2 bg-tint p-[22px] rail:border-l-0 rail:border-t phone:px-4 phone:py-[18px] ${chosen ? "rail:order-first" : ""}`}
        >
          {entry}
        </aside>
      </div>
    </Sheet>
  );
}

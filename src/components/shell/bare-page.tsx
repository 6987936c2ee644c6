import type { ReactNode } from "react";
import { Mark } from "./mark";
import { Sheet, SheetBody } from "./sheet";

/** A page without menu: nothing is known of who reads it. */
export function BarePage({ children }: { children: ReactNode }) {
  return (
    <>
      <header className="flex min-h-[52px] items-center gap-2.5 border-b border-rule-2 bg-sheet px-6 phone:px-4">
        <Mark />
        <span className="font-serif text-[1.25rem] font-semibold leading-none">Ebbmark</span>
      </header>
      <Sheet>
        <SheetBody>{children}</SheetBody>
      </Sheet>
    </>
  );
}

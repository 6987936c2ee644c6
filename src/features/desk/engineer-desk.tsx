import type { ReactNode } from "react";
import { ButtonLink } from "@/components/button/button-link";
import { PageHead } from "@/components/shell/page-head";
import { SheetWithMargin } from "@/components/shell/sheet";
import { pages } from "@/contracts/paths";
import type { DeskView } from "@/contracts/views";
import { HowToReadAnEbb } from "./how-to-read-an-ebb";
import { longDate } from "./long-date";
import { WaitsList } from "./waits-list";

/**
 * An engineer's first page: what waits, then what is theirs.
 *
 * children   the table of their screenings, or what stands in its place
 */
export function EngineerDesk({ desk, now, children }: { desk: DeskView; now: string; children: ReactNode }) {
  return (
    <SheetWithMargin margin={<HowToReadAnEbb />}>
      <PageHead title={`Desk, ${longDate(now)}`}>
        <ButtonLink kind="main" href={pages.newScreening()}>
          New screening
        </ButtonLink>
      </PageHead>
      <h2 className="mb-2">
        Waits on you <span className="text-body text-ink-3">{desk.waits.length}</span>
      </h2>
      {desk.waits.length > 0 ? (
        <WaitsList waits={desk.waits} />
      ) : (
        <p className="border-y py-3.5 font-serif text-prose text-ink-2">Nothing waits on you.</p>
      )}
      <h2 className="mb-1 mt-[34px]">Your screenings</h2>
      {children}
    </SheetWithMargin>
  );
}

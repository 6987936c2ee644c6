import type { ReactNode } from "react";
import { ButtonLink } from "@/components/button/button-link";
import { Sheet, SheetBody } from "@/components/shell/sheet";
import { Stop } from "@/components/states/stop";

/** A revision that has neither lines open to the viewer nor a stored run. */
export function NoFluid({ titleBlock, back }: { titleBlock: ReactNode; back: string }) {
  return (
    <Sheet>
      {titleBlock}
      <SheetBody>
        <Stop level={1} title="There is no fluid to show" action={<ButtonLink href={back}>Back to the sheet</ButtonLink>}>
          This revision has no run that was kept, and its lines are not open to you.
        </Stop>
      </SheetBody>
    </Sheet>
  );
}

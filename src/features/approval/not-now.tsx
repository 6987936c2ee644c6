import type { ReactNode } from "react";
import { ButtonLink } from "@/components/button/button-link";
import { Sheet, SheetBody } from "@/components/shell/sheet";
import { Stop } from "@/components/states/stop";
import { pages } from "@/contracts/paths";

/** A signing page that can't be used on this revision now, with the reason. */
export function NotNow({
  screeningId,
  title,
  titleBlock,
  children,
}: {
  screeningId: string;
  title: string;
  titleBlock: ReactNode;
  children: ReactNode;
}) {
  return (
    <Sheet>
      {titleBlock}
      <SheetBody>
        <Stop level={1} title={title} action={<ButtonLink href={pages.screening(screeningId)}>Read the record</ButtonLink>}>
          {children}
        </Stop>
      </SheetBody>
    </Sheet>
  );
}

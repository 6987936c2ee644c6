import { ButtonLink } from "@/components/button/button-link";
import { Sheet, SheetBody } from "@/components/shell/sheet";
import { Stop } from "@/components/states/stop";
import { pages } from "@/contracts/paths";

/** The strip stays: whoever reads this is signed in. */
export default function NotFound() {
  return (
    <Sheet>
      <SheetBody>
        <Stop
          level={1}
          title="There is nothing at this address"
          action={<ButtonLink href={pages.desk}>Back to the desk</ButtonLink>}
        >
          The record may have another number, or it belongs to a facility that your badge does not open. The administrator of the
          site can add you to it.
        </Stop>
      </SheetBody>
    </Sheet>
  );
}

import { ButtonLink } from "@/components/button/button-link";
import { BarePage } from "@/components/shell/bare-page";
import { pages } from "@/contracts/paths";
import { Stop } from "@/components/states/stop";

export default function NotFound() {
  return (
    <BarePage>
      <Stop
        level={1}
        title="There is nothing at this address"
        action={<ButtonLink href={pages.desk}>Back to the desk</ButtonLink>}
      >
        The record may have another number, or it belongs to a facility that your badge does not open. The administrator of the
        site can add you to it.
      </Stop>
    </BarePage>
  );
}

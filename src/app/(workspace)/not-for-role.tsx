import { ButtonLink } from "@/components/button/button-link";
import { Sheet, SheetBody } from "@/components/shell/sheet";
import { Stop } from "@/components/states/stop";
import { pages } from "@/contracts/paths";
import { roleWords, type Role } from "@/contracts/roles";
import type { Viewer } from "@/server/auth/viewer";

/**
 * A page that the viewer's role does not have.
 *
 * what   "Screenings"
 * who    roles that have it
 */
export function NotForRole({ viewer, what, who }: { viewer: Viewer; what: string; who: readonly Role[] }) {
  return (
    <Sheet>
      <SheetBody>
        <Stop
          level={1}
          title={`${what} are not open to your role`}
          action={<ButtonLink href={pages.desk}>Back to the desk</ButtonLink>}
        >
          You are signed in as {viewer.badge}, {viewer.role}. {what} are for:{" "}
          {who.map((role) => roleWords[role].toLowerCase()).join(", ")}. An administrator can change a role.
        </Stop>
      </SheetBody>
    </Sheet>
  );
}

import type { Metadata } from "next";
import { cookies } from "next/headers";
import { ButtonLink } from "@/components/button/button-link";
import { PageHead } from "@/components/shell/page-head";
import { Sheet, SheetBody } from "@/components/shell/sheet";
import { FactTable } from "@/components/table/table";
import { readTheme, themeCookie } from "@/components/theme/theme";
import { pages } from "@/contracts/paths";
import { roleWords } from "@/contracts/roles";
import { Appearance } from "@/features/account/appearance";
import { SessionsTable } from "@/features/account/sessions-table";
import { getAccount } from "@/server/account/read";
import { requireViewer } from "@/server/auth/viewer";

export const metadata: Metadata = { title: "Your account" };

export default async function AccountPage() {
  const viewer = await requireViewer();
  const { person, facilities, sessions } = await getAccount(viewer);
  const theme = readTheme((await cookies()).get(themeCookie)?.value);
  return (
    <Sheet>
      <SheetBody>
        <PageHead title={`Your account, ${person.badge}`}>
          <ButtonLink href={pages.changePassword}>Change password</ButtonLink>
        </PageHead>
        <FactTable
          settled
          caption="Your account"
          facts={[
            { label: "Printed name", value: person.printedName },
            { label: "Badge", value: person.badge },
            { label: "Role", value: roleWords[person.role] },
            {
              label: "Facilities",
              value: facilities.map(({ name }) => name).join(", ") || (person.role === "auditor" ? "all, reading only" : "none"),
            },
          ]}
        />
        <h2 className="mb-1 mt-8">Open sessions</h2>
        <SessionsTable sessions={sessions} />
        <h2 className="mb-1 mt-8">How you read</h2>
        <Appearance theme={theme} />
      </SheetBody>
    </Sheet>
  );
}

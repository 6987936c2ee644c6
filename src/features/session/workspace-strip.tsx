"use client";

import Link from "next/link";
import { usePathname } from "next/navigation";
import { BadgeMenu } from "@/components/shell/badge-menu";
import { Strip } from "@/components/shell/strip";
import type { Theme } from "@/components/theme/theme";
import { ThemeSwitch } from "@/components/theme/theme-switch";
import { UnitSwitch } from "@/components/units/unit-switch";
import { pages } from "@/contracts/paths";
import { roleWords } from "@/contracts/roles";
import type { ViewerView } from "@/contracts/views";
import { rememberChoice } from "@/features/query/remember-choice";
import { menuFor } from "./menu";
import { SignOutButton } from "./sign-out-button";

/** The strip of a signed-in person: the menu of the role, units shown, and what belongs to the badge. */
export function WorkspaceStrip({ viewer, theme }: { viewer: ViewerView; theme: Theme }) {
  const pathname = usePathname();
  return (
    <Strip
      menu={menuFor(viewer.role, pathname)}
      home={pages.desk}
      tools={
        <>
          <UnitSwitch onChange={(units) => rememberChoice({ units })} />
          <BadgeMenu badge={viewer.badge} role={roleWords[viewer.role]}>
            <p className="text-small text-ink-3">
              <b className="block text-body text-ink">{viewer.printedName}</b>
              {roleWords[viewer.role]} {viewer.badge}
              {viewer.demo && ", demo"}
            </p>
            <ThemeSwitch initial={theme} onChange={(chosen) => rememberChoice({ theme: chosen })} />
            <Link href={pages.account} className="flex min-h-[34px] items-center phone:min-h-[44px]">
              Your account
            </Link>
            <SignOutButton />
          </BadgeMenu>
        </>
      }
    />
  );
}

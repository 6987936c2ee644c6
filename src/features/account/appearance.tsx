"use client";

import type { Theme } from "@/components/theme/theme";
import { ThemeSwitch } from "@/components/theme/theme-switch";
import { UnitSwitch } from "@/components/units/unit-switch";
import { rememberChoice } from "@/features/query/remember-choice";

/** Units and sheet as the person likes to read. They change what is shown, never what is stored. */
export function Appearance({ theme }: { theme: Theme }) {
  return (
    <div className="grid max-w-[420px] gap-4 border-t pt-3">
      <div className="flex items-center justify-between gap-3">
        <span>Units shown</span>
        <UnitSwitch onChange={(units) => rememberChoice({ units })} />
      </div>
      <ThemeSwitch initial={theme} onChange={(chosen) => rememberChoice({ theme: chosen })} />
    </div>
  );
}

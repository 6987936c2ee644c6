"use client";

import { useMemo } from "react";
import { useUnits } from "@/components/units/units-provider";
import type { Showing } from "./limit-rows";

/** The person's system of units and the site's datum, for what formats on its own. */
export function useShowing(): Showing {
  const { system, barometricPressurePa } = useUnits();
  return useMemo(() => ({ system, barometricPressurePa }), [system, barometricPressurePa]);
}

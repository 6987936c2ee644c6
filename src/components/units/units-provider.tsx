"use client";

import { createContext, useCallback, useContext, useMemo, useState, type ReactNode } from "react";
import { standardAtmospherePa } from "@/engine/units";
import { keepInCookie } from "../cookie";
import { unitsCookie, type UnitSystem } from "./unit-system";

type Units = {
  system: UnitSystem;
  setSystem: (system: UnitSystem) => void;
  /** Datum of gauge pressures at the site in hand, in Pa absolute. */
  barometricPressurePa: number;
};

const UnitsContext = createContext<Units>({
  system: "SI",
  setSystem: () => {},
  barometricPressurePa: standardAtmospherePa,
});

/** Holds the system of units that values are shown in. Switching changes what is shown, never what is stored. */
export function UnitsProvider({ initial, children }: { initial: UnitSystem; children: ReactNode }) {
  const [system, show] = useState(initial);
  const setSystem = useCallback((chosen: UnitSystem) => {
    show(chosen);
    keepInCookie(unitsCookie, chosen);
  }, []);
  const units = useMemo(() => ({ system, setSystem, barometricPressurePa: standardAtmospherePa }), [system, setSystem]);
  return <UnitsContext.Provider value={units}>{children}</UnitsContext.Provider>;
}

/** Sets the barometric pressure that gauge values inside are measured from. */
export function SitePressure({ barometricPressurePa, children }: { barometricPressurePa: number; children: ReactNode }) {
  const { system, setSystem } = useContext(UnitsContext);
  const units = useMemo(() => ({ system, setSystem, barometricPressurePa }), [system, setSystem, barometricPressurePa]);
  return <UnitsContext.Provider value={units}>{children}</UnitsContext.Provider>;
}

export const useUnits = (): Units => useContext(UnitsContext);

import type { QuantityId } from "@/engine/units";
import type { UnitSystem } from "../units/unit-system";

/** Unit that results of each quantity are shown in. Lines of the form name their own. */
const table: Record<QuantityId, Record<UnitSystem, string>> = {
  pressure: { SI: "bar(g)", US: "psig" },
  pressureDifference: { SI: "bar", US: "psi" },
  temperature: { SI: "°C", US: "°F" },
  temperatureDifference: { SI: "K", US: "°F difference" },
  length: { SI: "mm", US: "in" },
  area: { SI: "m²", US: "ft²" },
  volume: { SI: "m³", US: "ft³" },
  mass: { SI: "kg", US: "lb" },
  massRate: { SI: "kg/s", US: "lb/h" },
  massFlux: { SI: "kg/(m²·s)", US: "lb/(ft²·s)" },
  power: { SI: "kW", US: "Btu/h" },
  energy: { SI: "MJ", US: "MMBtu" },
  molarEnergy: { SI: "kJ/mol", US: "Btu/lbmol" },
  molarEntropy: { SI: "J/(mol·K)", US: "Btu/(lbmol·°F)" },
  specificEnergy: { SI: "kJ/kg", US: "Btu/lb" },
  heatFlux: { SI: "kW/m²", US: "Btu/(h·ft²)" },
  filmCoefficient: { SI: "W/(m²·K)", US: "Btu/(h·ft²·°F)" },
  conductivity: { SI: "W/(m·K)", US: "Btu/(h·ft·°F)" },
  specificHeat: { SI: "J/(kg·K)", US: "Btu/(lb·°F)" },
  time: { SI: "min", US: "min" },
  density: { SI: "kg/m³", US: "lb/ft³" },
  molarVolume: { SI: "m³/kmol", US: "ft³/lbmol" },
  molarMass: { SI: "g/mol", US: "g/mol" },
  speed: { SI: "m/s", US: "ft/s" },
  viscosity: { SI: "mPa·s", US: "cP" },
  surfaceTension: { SI: "mN/m", US: "dyn/cm" },
  jouleThomson: { SI: "K/bar", US: "°F/psi" },
  flowCoefficient: { SI: "Kv", US: "Cv" },
  fraction: { SI: "–", US: "–" },
};

export const shownUnit = (quantity: QuantityId, system: UnitSystem): string => table[quantity][system];

/** Absolute pressures, where a chart or a state is absolute. */
export const shownAbsolutePressure: Record<UnitSystem, string> = { SI: "bar(a)", US: "psia" };

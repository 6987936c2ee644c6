/**
 * The one table of units. Everything inside is SI; a value is converted where a form is read and where it is shown, nowhere else.
 *
 * `factor` is the SI size of one unit, `offset` is added after it: si = value · factor + offset. A gauge unit is measured from the
 * barometric pressure of the site, which the caller gives.
 *
 * Source   NIST Special Publication 811 (2008), appendix B, and the definitions it rests on: 1 in = 0.0254 m, 1 lb = 0.45359237 kg,
 *          standard gravity 9.80665 m/s², 1 Btu(IT) = 1055.05585262 J, 1 US barrel = 42 gallons of 231 in³ (all exact).
 */

const inch = 0.0254;
const foot = 0.3048;
const pound = 0.45359237;
const standardGravity = 9.80665;
const btu = 1055.05585262;
const rankine = 1 / 1.8;
const psi = (pound * standardGravity) / inch ** 2;
const gallon = 231 * inch ** 3;
const barrel = 42 * gallon;
/** IEC 60534-1: Kv in m³/h of water at 1 bar, Cv in US gallons a minute at 1 psi; Kv/Cv = 0.865. */
const kvPerCv = gallon * 60 * Math.sqrt(1e5 / psi);

/** 1 atm, the barometric pressure where none is given, and the datum of every key of the case format that says gauge. */
export const standardAtmospherePa = 101325;

export type Unit = {
  factor: number;
  offset?: number;
  gauge?: true;
  /** Other ways people write the unit; compared without case, spaces and dots. */
  aliases?: readonly string[];
};

type Quantity = { si: string; title: string; shown: Record<string, Unit> };

export const units = {
  pressure: {
    si: "Pa",
    title: "pressure",
    shown: {
      "bar(a)": { factor: 1e5, aliases: ["bara", "bar abs", "bar a"] },
      "bar(g)": { factor: 1e5, gauge: true, aliases: ["barg", "bar g", "bar gauge"] },
      psia: { factor: psi, aliases: ["psi(a)", "psi abs"] },
      psig: { factor: psi, gauge: true, aliases: ["psi(g)", "psi gauge"] },
      kPa: { factor: 1e3, aliases: ["kpa(a)", "kpaa"] },
      MPa: { factor: 1e6, aliases: ["mpa(a)", "mpaa"] },
      Pa: { factor: 1 },
      atm: { factor: standardAtmospherePa },
    },
  },
  pressureDifference: {
    si: "Pa",
    title: "pressure difference",
    shown: { bar: { factor: 1e5 }, psi: { factor: psi }, mbar: { factor: 100 }, kPa: { factor: 1e3 }, Pa: { factor: 1 } },
  },
  temperature: {
    si: "K",
    title: "temperature",
    shown: {
      "°C": { factor: 1, offset: 273.15, aliases: ["c", "degc", "ºc", "℃", "celsius"] },
      "°F": { factor: rankine, offset: 459.67 / 1.8, aliases: ["f", "degf", "ºf", "℉", "fahrenheit"] },
      K: { factor: 1, aliases: ["kelvin"] },
      "°R": { factor: rankine, aliases: ["r", "degr", "ºr", "rankine"] },
    },
  },
  temperatureDifference: {
    si: "K",
    title: "temperature difference",
    shown: {
      K: { factor: 1, aliases: ["°c", "c", "degc", "°c difference", "kelvin"] },
      "°F difference": { factor: rankine, aliases: ["°f", "f", "degf", "°r", "f difference"] },
    },
  },
  length: {
    si: "m",
    title: "length",
    shown: {
      mm: { factor: 1e-3 },
      m: { factor: 1 },
      in: { factor: inch, aliases: ['"', "″", "inch", "inches"] },
      ft: { factor: foot, aliases: ["'", "′", "foot", "feet"] },
      cm: { factor: 1e-2 },
    },
  },
  area: {
    si: "m²",
    title: "area",
    shown: {
      "m²": { factor: 1, aliases: ["m2", "sq m"] },
      "mm²": { factor: 1e-6, aliases: ["mm2", "sq mm"] },
      "in²": { factor: inch ** 2, aliases: ["in2", "sq in"] },
      "ft²": { factor: foot ** 2, aliases: ["ft2", "sq ft"] },
    },
  },
  volume: {
    si: "m³",
    title: "volume",
    shown: {
      "m³": { factor: 1, aliases: ["m3", "cu m"] },
      L: { factor: 1e-3, aliases: ["litre", "litres", "liter", "liters"] },
      "ft³": { factor: foot ** 3, aliases: ["ft3", "cu ft"] },
      bbl: { factor: barrel, aliases: ["barrel", "barrels"] },
    },
  },
  mass: {
    si: "kg",
    title: "mass",
    shown: {
      kg: { factor: 1 },
      t: { factor: 1e3, aliases: ["tonne", "tonnes"] },
      lb: { factor: pound, aliases: ["lbs", "lbm"] },
    },
  },
  massRate: {
    si: "kg/s",
    title: "mass rate",
    shown: {
      "kg/s": { factor: 1 },
      "kg/h": { factor: 1 / 3600, aliases: ["kg/hr"] },
      "t/h": { factor: 1e3 / 3600, aliases: ["t/hr"] },
      "lb/h": { factor: pound / 3600, aliases: ["lb/hr", "lbs/hr", "lbm/h", "pph"] },
      "lb/s": { factor: pound, aliases: ["lbm/s"] },
    },
  },
  massFlux: {
    si: "kg/(m²·s)",
    title: "mass flux",
    shown: {
      "kg/(m²·s)": { factor: 1, aliases: ["kg/m2/s", "kg/m²/s", "kg/(m2·s)"] },
      "lb/(ft²·s)": { factor: pound / foot ** 2, aliases: ["lb/ft2/s", "lb/(ft2·s)"] },
    },
  },
  power: {
    si: "W",
    title: "heat rate",
    shown: {
      kW: { factor: 1e3 },
      W: { factor: 1 },
      MW: { factor: 1e6 },
      "Btu/h": { factor: btu / 3600, aliases: ["btu/hr", "btuh"] },
      "MMBtu/h": { factor: (1e6 * btu) / 3600, aliases: ["mmbtu/hr"] },
    },
  },
  energy: {
    si: "J",
    title: "energy",
    shown: {
      MJ: { factor: 1e6 },
      kJ: { factor: 1e3 },
      J: { factor: 1 },
      GJ: { factor: 1e9 },
      kWh: { factor: 3.6e6 },
      Btu: { factor: btu },
      MMBtu: { factor: 1e6 * btu },
    },
  },
  molarEnergy: {
    si: "J/mol",
    title: "molar energy",
    shown: {
      "J/mol": { factor: 1 },
      "kJ/mol": { factor: 1e3 },
      "Btu/lbmol": { factor: btu / (1e3 * pound), aliases: ["btu/lb-mol"] },
    },
  },
  molarEntropy: {
    si: "J/(mol·K)",
    title: "molar entropy",
    shown: {
      "J/(mol·K)": { factor: 1, aliases: ["j/mol/k", "j/mol·k"] },
      "Btu/(lbmol·°F)": { factor: (btu * 1.8) / (1e3 * pound), aliases: ["btu/lbmol/f", "btu/(lbmol·f)"] },
    },
  },
  specificEnergy: {
    si: "J/kg",
    title: "specific energy",
    shown: { "kJ/kg": { factor: 1e3 }, "J/kg": { factor: 1 }, "Btu/lb": { factor: btu / pound, aliases: ["btu/lbm"] } },
  },
  heatFlux: {
    si: "W/m²",
    title: "heat flux",
    shown: {
      "kW/m²": { factor: 1e3, aliases: ["kw/m2"] },
      "W/m²": { factor: 1, aliases: ["w/m2"] },
      "Btu/(h·ft²)": { factor: btu / (3600 * foot ** 2), aliases: ["btu/h/ft2", "btu/hr/ft2", "btu/(hr·ft2)", "btu/(h·ft2)"] },
    },
  },
  filmCoefficient: {
    si: "W/(m²·K)",
    title: "film coefficient",
    shown: {
      "W/(m²·K)": { factor: 1, aliases: ["w/m2/k", "w/m2k", "w/(m2·k)", "w/m²k"] },
      "Btu/(h·ft²·°F)": {
        factor: (btu * 1.8) / (3600 * foot ** 2),
        aliases: ["btu/h/ft2/f", "btu/hr/ft2/f", "btu/(h·ft2·f)", "btu/(hr·ft2·f)", "btu/(hr·ft²·°f)"],
      },
    },
  },
  conductivity: {
    si: "W/(m·K)",
    title: "thermal conductivity",
    shown: {
      "W/(m·K)": { factor: 1, aliases: ["w/m/k", "w/mk"] },
      "Btu/(h·ft·°F)": { factor: (btu * 1.8) / (3600 * foot), aliases: ["btu/h/ft/f", "btu/hr/ft/f", "btu/(h·ft·f)"] },
    },
  },
  specificHeat: {
    si: "J/(kg·K)",
    title: "specific heat",
    shown: {
      "J/(kg·K)": { factor: 1, aliases: ["j/kg/k", "j/kgk"] },
      "kJ/(kg·K)": { factor: 1e3, aliases: ["kj/kg/k", "kj/kgk"] },
      "Btu/(lb·°F)": { factor: (btu * 1.8) / pound, aliases: ["btu/lb/f", "btu/(lb·f)"] },
    },
  },
  time: {
    si: "s",
    title: "time",
    shown: {
      s: { factor: 1, aliases: ["sec", "second", "seconds"] },
      min: { factor: 60, aliases: ["minute", "minutes"] },
      h: { factor: 3600, aliases: ["hr", "hour", "hours"] },
      d: { factor: 86400, aliases: ["day", "days"] },
    },
  },
  density: {
    si: "kg/m³",
    title: "density",
    shown: { "kg/m³": { factor: 1, aliases: ["kg/m3"] }, "lb/ft³": { factor: pound / foot ** 3, aliases: ["lb/ft3"] } },
  },
  molarVolume: {
    si: "m³/mol",
    title: "molar volume",
    shown: {
      "m³/kmol": { factor: 1e-3, aliases: ["m3/kmol"] },
      "m³/mol": { factor: 1, aliases: ["m3/mol"] },
      "ft³/lbmol": { factor: foot ** 3 / (1e3 * pound), aliases: ["ft3/lbmol"] },
    },
  },
  molarMass: {
    si: "kg/mol",
    title: "molar mass",
    shown: { "g/mol": { factor: 1e-3, aliases: ["kg/kmol", "lb/lbmol"] }, "kg/mol": { factor: 1 } },
  },
  speed: {
    si: "m/s",
    title: "speed",
    shown: { "m/s": { factor: 1 }, "ft/s": { factor: foot }, "km/h": { factor: 1 / 3.6 }, mph: { factor: (5280 * foot) / 3600 } },
  },
  viscosity: {
    si: "Pa·s",
    title: "viscosity",
    shown: { "mPa·s": { factor: 1e-3, aliases: ["mpas"] }, "Pa·s": { factor: 1, aliases: ["pas"] }, cP: { factor: 1e-3 } },
  },
  surfaceTension: {
    si: "N/m",
    title: "surface tension",
    shown: { "mN/m": { factor: 1e-3 }, "N/m": { factor: 1 }, "dyn/cm": { factor: 1e-3 } },
  },
  jouleThomson: {
    si: "K/Pa",
    title: "Joule-Thomson coefficient",
    shown: { "K/bar": { factor: 1e-5 }, "K/Pa": { factor: 1 }, "°F/psi": { factor: 1 / (1.8 * psi) } },
  },
  flowCoefficient: { si: "Cv", title: "flow coefficient", shown: { Kv: { factor: 1 / kvPerCv }, Cv: { factor: 1 } } },
  fraction: {
    si: "–",
    title: "pure number",
    shown: { "–": { factor: 1, aliases: ["-", "—", "1"] }, "%": { factor: 0.01, aliases: ["percent", "pct"] } },
  },
} as const satisfies Record<string, Quantity>;

export type QuantityId = keyof typeof units;

/** Symbols of the units a quantity can be shown in, in the order a menu lists them. */
export const unitSymbols = (quantity: QuantityId): string[] => Object.keys(units[quantity].shown);

/** The unit behind a symbol of the table. A symbol that isn't there is a fault of the caller, not of the person who typed. */
export function unitOf(quantity: QuantityId, symbol: string): Unit {
  const shown: Record<string, Unit> = units[quantity].shown;
  const unit = Object.hasOwn(shown, symbol) ? shown[symbol] : undefined;
  if (!unit)
    throw new RangeError(`${symbol} is no unit of ${units[quantity].title}; known are ${unitSymbols(quantity).join(", ")}`);
  return unit;
}

/** SI value of `value` in the unit. `barometricPressurePa` counts for gauge units only. */
export function toSi(quantity: QuantityId, value: number, symbol: string, barometricPressurePa = standardAtmospherePa): number {
  const { factor, offset = 0, gauge } = unitOf(quantity, symbol);
  return value * factor + offset + (gauge ? barometricPressurePa : 0);
}

/** The inverse of `toSi`. */
export function fromSi(quantity: QuantityId, si: number, symbol: string, barometricPressurePa = standardAtmospherePa): number {
  const { factor, offset = 0, gauge } = unitOf(quantity, symbol);
  return (si - offset - (gauge ? barometricPressurePa : 0)) / factor;
}

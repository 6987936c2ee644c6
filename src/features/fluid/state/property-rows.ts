/** The rows of the property table: what each shows of the whole and of each phase, and in which quantity. Pure. */
import type { BulkProperties, PhaseProperties, StateProperties } from "@/engine/properties/state-properties";
import type { QuantityId } from "@/engine/units";
import type { Basis } from "./basis-switch";

export type PropertyRow = {
  name: string;
  quantity: QuantityId;
  /** Small type under the name. */
  note?: string;
  /** Decimals of a pure number, where the usual three figures are too few. */
  decimals?: number;
  /** Of the whole; absent where only a phase has it. */
  overall?: number;
  phases: (number | undefined)[];
};

type Of = {
  name: string;
  quantity: QuantityId;
  note?: string;
  decimals?: number;
  bulk?: (one: BulkProperties) => number;
  phase: (one: PhaseProperties) => number | undefined;
};

/** Energies and heat capacities stand per mole or per mass; a molar value over the molar mass of its own phase. */
const energies: {
  key: "internalEnergyJPerMol" | "enthalpyJPerMol" | "entropyJPerMolK";
  name: string;
  of: Record<Basis, QuantityId>;
}[] = [
  { key: "internalEnergyJPerMol", name: "Internal energy", of: { mole: "molarEnergy", mass: "specificEnergy" } },
  { key: "enthalpyJPerMol", name: "Enthalpy", of: { mole: "molarEnergy", mass: "specificEnergy" } },
  { key: "entropyJPerMolK", name: "Entropy", of: { mole: "molarEntropy", mass: "specificHeat" } },
];

const heatCapacities: { key: "heatCapacityPJPerMolK" | "heatCapacityVJPerMolK"; name: string }[] = [
  { key: "heatCapacityPJPerMolK", name: "Heat capacity at constant pressure" },
  { key: "heatCapacityVJPerMolK", name: "Heat capacity at constant volume" },
];

export function propertyRows({ overall, phases }: StateProperties, basis: Basis): PropertyRow[] {
  const per = ({ molarMassKgPerMol }: BulkProperties) => (basis === "mole" ? 1 : molarMassKgPerMol);
  const both = (name: string, quantity: QuantityId, value: (one: BulkProperties) => number): Of => ({
    name,
    quantity,
    bulk: value,
    phase: value,
  });
  const rows: Of[] = [
    both("Density", "density", (one) => one.densityKgPerM3),
    both("Molar volume", "molarVolume", (one) => one.molarVolumeM3PerMol),
    { ...both("Compressibility factor", "fraction", (one) => one.compressibility), decimals: 4 },
    both("Molar mass", "molarMass", (one) => one.molarMassKgPerMol),
    ...energies.map(({ key, name, of }) => both(name, of[basis], (one) => one[key] / per(one))),
    ...heatCapacities.map(({ key, name }): Of => ({
      name,
      quantity: basis === "mole" ? "molarEntropy" : "specificHeat",
      phase: (one) => one[key] / per(one),
    })),
    { name: "Ratio of heat capacities", quantity: "fraction", decimals: 3, phase: (one) => one.heatCapacityRatio },
    { name: "Speed of sound", quantity: "speed", phase: (one) => one.soundSpeedMPerS },
    {
      name: "Joule-Thomson coefficient",
      quantity: "jouleThomson",
      note: "negative: warms on throttling",
      phase: (one) => one.jouleThomsonKPerPa,
    },
    { name: "Viscosity", quantity: "viscosity", note: "general correlation", phase: (one) => one.viscosityPaS },
    {
      name: "Thermal conductivity",
      quantity: "conductivity",
      note: "general correlation",
      phase: (one) => one.conductivityWPerMK,
    },
    { name: "Prandtl number", quantity: "fraction", phase: (one) => one.prandtl },
    {
      name: "Surface tension",
      quantity: "surfaceTension",
      note: "estimate for non-polar liquids",
      phase: (one) => one.surfaceTensionNPerM,
    },
  ];
  return rows
    .map(({ name, quantity, note, decimals, bulk, phase }): PropertyRow => ({
      name,
      quantity,
      ...(note === undefined ? {} : { note }),
      ...(decimals === undefined ? {} : { decimals }),
      ...(bulk ? { overall: bulk(overall) } : {}),
      phases: phases.map(phase),
    }))
    .filter(({ phases: values }) => values.some((value) => value !== undefined));
}

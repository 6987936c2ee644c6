import table from "./data/components.json";
import type { Substance } from "./substance";

/** One row of data/components.json: constants with their sources, kept as published. */
export interface LibraryRow {
  id: string;
  name: string;
  formula: string;
  cas: string;
  molarMass_kg_per_mol: number;
  Tc_K: number;
  Pc_Pa: number;
  acentricFactor: number;
  Vc_m3_per_mol: number;
  normalBoilingPoint_K: number;
  triplePoint: { T_K: number; p_Pa: number };
  meltingPoint_K: number;
  cp0: { c0: number; terms: { n: number; theta_K: number }[]; range_K: [number, number]; method: string; note: string };
  volumeTranslation: { PR_m3_per_mol: number; SRK_m3_per_mol: number };
  /** Net, gas at 25 °C to gaseous products; null where it does not burn or is not held. */
  lowerHeatingValue_J_per_mol: number | null;
  alsoIn: { gerg2008: boolean; helmholtz: boolean };
  sources: { critical: string; nbp: string; melting: string; eosCitation?: string };
}

/** The data file is checked by library.test.ts; its rows carry more keys than the engine reads. */
export const libraryRows = (table as unknown as { components: LibraryRow[] }).components;

const byId = new Map(libraryRows.map((row) => [row.id, row]));

export const libraryIds: readonly string[] = libraryRows.map((row) => row.id);

export function findLibraryRow(id: string): LibraryRow | undefined {
  return byId.get(id);
}

export function librarySubstance(row: LibraryRow): Substance {
  return {
    id: row.id,
    name: row.name,
    origin: "library",
    molarMassKgPerMol: row.molarMass_kg_per_mol,
    criticalTemperatureK: row.Tc_K,
    criticalPressurePa: row.Pc_Pa,
    acentricFactor: row.acentricFactor,
    criticalVolumeM3PerMol: row.Vc_m3_per_mol,
    heatCapacity: {
      form: "planck-einstein",
      c0: row.cp0.c0,
      terms: row.cp0.terms.map(({ n, theta_K }) => ({ n, thetaK: theta_K })),
    },
    heatCapacityRangeK: row.cp0.range_K,
    triplePointK: row.triplePoint.T_K,
    notes: [],
  };
}

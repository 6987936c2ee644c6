import table from "../../substances/data/gerg2008.json";
import type { HeatCapacity } from "../../substances/heat-capacity";
import type { KunzTerm } from "../reference/reduced-terms";
import type { ReferenceTerm } from "../reference/reference-data";

interface GergRow {
  id: string;
  molarMass_kg_per_mol: number;
  Tc_K: number;
  rhoc_mol_per_m3: number;
  ideal: { n3: number; sinh: { n: number; theta_K: number }[]; cosh: { n: number; theta_K: number }[] };
  residual: { n: number; d: number; t: number; c: number }[];
}

interface BinaryRow {
  i: string;
  j: string;
  betaV: number;
  gammaV: number;
  betaT: number;
  gammaT: number;
  F: number;
  departure?: string | null;
}

interface DepartureRow {
  terms: { n: number; d: number; t: number; eta?: number; epsilon?: number; beta?: number; gamma?: number }[];
}

const data = table as unknown as {
  constants: { R: number; Rstar: number };
  validity: Record<"normal" | "extended", { T_K: [number, number]; p_Pa: [number, number] }>;
  components: GergRow[];
  binary: BinaryRow[];
  departureFunctions: Record<string, DepartureRow>;
};

/** R of the mixture equation, and that of the older fits of the ideal part [J/(mol K)]. */
export const gergConstants = data.constants;
export const gergValidity = data.validity;
export const gergComponents: ReadonlyMap<string, GergRow> = new Map(data.components.map((row) => [row.id, row]));

export function gergResidualTerms(id: string): ReferenceTerm[] {
  return gergComponents
    .get(id)!
    .residual.map(({ n, d, t, c }) => (c === 0 ? { type: "power", n, d, t } : { type: "exponential", n, d, t, l: c }));
}

export interface GergPair {
  betaV: number;
  gammaV: number;
  betaT: number;
  gammaT: number;
  /** Weight of the departure function; 0 where the pair has none. */
  F: number;
  departure: (ReferenceTerm | KunzTerm)[];
}

const pairs = new Map(data.binary.map((row) => [`${row.i}|${row.j}`, row]));

/** Reducing parameters in the order (i, j): the other way round, β becomes 1/β. */
export function gergPair(i: string, j: string): GergPair {
  const straight = pairs.get(`${i}|${j}`);
  const row = straight ?? pairs.get(`${j}|${i}`);
  if (!row) throw new Error(`GERG-2008 has no pair ${i}, ${j}`);
  const departure = row.F !== 0 && row.departure ? departureTerms(row.departure) : [];
  const { betaV, gammaV, betaT, gammaT, F } = row;
  return straight
    ? { betaV, gammaV, betaT, gammaT, F, departure }
    : { betaV: 1 / betaV, gammaV, betaT: 1 / betaT, gammaT, F, departure };
}

function departureTerms(name: string): (ReferenceTerm | KunzTerm)[] {
  return data.departureFunctions[name]!.terms.map(({ n, d, t, eta, epsilon, beta, gamma }) =>
    eta === undefined
      ? { type: "power", n, d, t }
      : { type: "kunz", n, d, t, eta, epsilon: epsilon!, beta: beta!, gamma: gamma! },
  );
}

/**
 * The ideal part as Planck-Einstein terms: with y = θ/T, (y/sinh y)² is the term of 2θ, and (y/cosh y)² that of 2θ less that
 * of 4θ, because 1/(eˣ + 1) = 1/(eˣ − 1) − 2/(e²ˣ − 1).
 */
export function gergHeatCapacity(id: string): HeatCapacity {
  const { n3, sinh, cosh } = gergComponents.get(id)!.ideal;
  const ratio = gergConstants.Rstar / gergConstants.R;
  return {
    form: "planck-einstein",
    c0: 1 + ratio * (n3 - 1), // the older R scales cv0, not the R between cv0 and cp0
    terms: [
      ...sinh.map(({ n, theta_K }) => ({ n: ratio * n, thetaK: 2 * theta_K })),
      ...cosh.flatMap(({ n, theta_K }) => [
        { n: ratio * n, thetaK: 2 * theta_K },
        { n: -ratio * n, thetaK: 4 * theta_K },
      ]),
    ],
  };
}

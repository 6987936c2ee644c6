import table from "../../substances/data/helmholtz.json";

/** Terms of the residual part, in the notation of the file's `formulae`. */
export type ReferenceTerm =
  | { type: "power"; n: number; d: number; t: number }
  | { type: "exponential"; n: number; d: number; t: number; l: number }
  | { type: "gaussian"; n: number; d: number; t: number; eta: number; beta: number; gamma: number; epsilon: number }
  | { type: "gao_b"; n: number; d: number; t: number; eta: number; beta: number; gamma: number; epsilon: number; b: number }
  | NonAnalyticTerm;

export interface NonAnalyticTerm {
  type: "non_analytic";
  n: number;
  a: number;
  b: number;
  beta: number;
  A: number;
  B: number;
  C: number;
  D: number;
}

export type IdealTerm =
  | { type: "lead"; a1: number; a2: number }
  | { type: "log_tau"; a: number }
  | { type: "power"; terms: { n: number; t: number }[] }
  | { type: "planck_einstein"; terms: { n: number; theta: number }[] }
  | { type: "offset"; a1: number; a2: number };

export interface Ancillary {
  form: "exp_tau" | "exp" | "one_plus";
  Tr_K: number;
  reducing: number;
  terms: { n: number; t: number }[];
}

export interface ReferenceFluid {
  id: string;
  name: string;
  citation: string;
  molarMass_kg_per_mol: number;
  R_J_per_molK: number;
  reducing: { T_K: number; rho_mol_per_m3: number };
  critical: { T_K: number; p_Pa: number; rho_mol_per_m3: number };
  triple: { T_K: number; p_Pa: number };
  acentricFactor: number;
  validity: { Tmin_K: number; Tmax_K: number; pmax_Pa: number };
  ideal: IdealTerm[];
  residual: ReferenceTerm[];
  saturationAncillaries: { pSat: Ancillary; rhoLiquid: Ancillary; rhoVapour: Ancillary };
}

/** The file is checked against its published states by reference.checks.test.ts. */
export const referenceFluids: ReadonlyMap<string, ReferenceFluid> = new Map(
  (table as unknown as { fluids: ReferenceFluid[] }).fluids.map((fluid) => [fluid.id, fluid]),
);

/** A first guess on the saturation line; nothing in a result depends on it. */
export function ancillary({ form, Tr_K, reducing, terms }: Ancillary, T: number): number {
  const theta = Math.max(0, 1 - T / Tr_K);
  let sum = 0;
  for (const { n, t } of terms) sum += n * theta ** t;
  if (form === "exp_tau") return reducing * Math.exp((Tr_K / T) * sum);
  return form === "exp" ? reducing * Math.exp(sum) : reducing * (1 + sum);
}

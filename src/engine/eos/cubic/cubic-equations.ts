import type { EquationId } from "../../cases/fluid-spec";
import type { InteractionFamily } from "../../substances/interaction";

/**
 * The cubic equations of state as one form,
 *
 *   p = R T/(v − b) − a(T)/[(v + δ1 b)(v + δ2 b)],   a = Ωa R² Tc²/pc · α(T/Tc),   b = Ωb R Tc/pc
 *
 * with Ωa and Ωb at full precision, from the condition that the critical isotherm has a horizontal inflection at (Tc, pc).
 * α is the square of a root that is linear in √T (Soave), constant (van der Waals) or Tr^(-1/4) (Redlich-Kwong).
 */
export interface CubicEquation {
  title: string;
  source: string;
  delta1: number;
  delta2: number;
  omegaA: number;
  omegaB: number;
  alpha: { kind: "constant" } | { kind: "inverse-root" } | { kind: "soave"; slope: (acentricFactor: number) => number };
  /** The published interaction parameters that belong to it; undefined where none do. */
  interaction?: InteractionFamily;
}

const redlichKwongB = (Math.cbrt(2) - 1) / 3;
const redlichKwongA = 1 / (9 * (Math.cbrt(2) - 1));
/** η = b/v_c of Peng-Robinson: η = [1 + ∛(4−√8) + ∛(4+√8)]⁻¹ (closed form of the critical condition). */
const pengRobinsonEta = 1 / (1 + Math.cbrt(4 - Math.sqrt(8)) + Math.cbrt(4 + Math.sqrt(8)));
const pengRobinsonA = (8 + 40 * pengRobinsonEta) / (49 - 37 * pengRobinsonEta);
const pengRobinsonB = pengRobinsonEta / (pengRobinsonEta + 3);

const pengRobinson = {
  delta1: 1 + Math.SQRT2,
  delta2: 1 - Math.SQRT2,
  omegaA: pengRobinsonA,
  omegaB: pengRobinsonB,
  interaction: "PR",
} as const;

const slope1976 = (w: number) => 0.37464 + 1.54226 * w - 0.26992 * w * w;

export const cubicEquations = {
  "van-der-waals": {
    title: "van der Waals 1873",
    source: "van der Waals, Over de Continuiteit van den Gas- en Vloeistoftoestand, Leiden 1873",
    delta1: 0,
    delta2: 0,
    omegaA: 27 / 64,
    omegaB: 1 / 8,
    alpha: { kind: "constant" },
  },
  "redlich-kwong": {
    title: "Redlich-Kwong 1949",
    source: "Redlich and Kwong, Chem. Rev. 44 (1949) 233-244",
    delta1: 1,
    delta2: 0,
    omegaA: redlichKwongA,
    omegaB: redlichKwongB,
    alpha: { kind: "inverse-root" },
  },
  "soave-redlich-kwong": {
    title: "Soave-Redlich-Kwong 1972",
    source: "Soave, Chem. Eng. Sci. 27 (1972) 1197-1203",
    delta1: 1,
    delta2: 0,
    omegaA: redlichKwongA,
    omegaB: redlichKwongB,
    alpha: { kind: "soave", slope: (w) => 0.48 + 1.574 * w - 0.176 * w * w },
    interaction: "SRK",
  },
  "peng-robinson-1976": {
    title: "Peng-Robinson 1976",
    source: "Peng and Robinson, Ind. Eng. Chem. Fundam. 15 (1976) 59-64",
    ...pengRobinson,
    alpha: { kind: "soave", slope: slope1976 },
  },
  "peng-robinson-1978": {
    title: "Peng-Robinson 1978",
    source: "Robinson and Peng, Gas Processors Association Research Report RR-28 (1978)",
    ...pengRobinson,
    alpha: {
      kind: "soave",
      slope: (w) => (w <= 0.491 ? slope1976(w) : 0.379642 + 1.48503 * w - 0.164423 * w * w + 0.016666 * w * w * w),
    },
  },
} as const satisfies Partial<Record<EquationId, CubicEquation>>;

export type CubicEquationId = keyof typeof cubicEquations;

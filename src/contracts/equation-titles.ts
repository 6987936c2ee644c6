import type { EquationId } from "@/engine/cases/fluid-spec";

/** Names of the equations for pages, which must not load the equations themselves. */
export const equationTitles: Record<EquationId, string> = {
  "van-der-waals": "van der Waals 1873",
  "redlich-kwong": "Redlich–Kwong 1949",
  "soave-redlich-kwong": "Soave–Redlich–Kwong 1972",
  "peng-robinson-1976": "Peng–Robinson 1976",
  "peng-robinson-1978": "Peng–Robinson 1978",
  "gerg-2008": "GERG-2008",
  reference: "Reference equation of the pure fluid",
};

import type { EquationId, FluidSpec } from "../cases/fluid-spec";
import type { Substance } from "../substances/substance";
import { buildCubic } from "./cubic/build-cubic";
import { cubicEquations, type CubicEquationId } from "./cubic/cubic-equations";
import type { FluidModel } from "./fluid-model";
import { buildGerg } from "./gerg/build-gerg";
import { buildReference } from "./reference/build-reference";

/** What an equation's own file offers; one line below makes it known to the form, the schema, the tests and the spread. */
export interface EquationEntry {
  id: EquationId;
  title: string;
  source: string;
  build(fluid: FluidSpec, substances: readonly Substance[], feed: Float64Array): FluidModel;
}

const cubicEntry = (id: CubicEquationId): EquationEntry => ({
  id,
  title: cubicEquations[id].title,
  source: cubicEquations[id].source,
  build: (fluid, substances, feed) => buildCubic(id, fluid, substances, feed),
});

export const equations: Partial<Record<EquationId, EquationEntry>> = {
  "van-der-waals": cubicEntry("van-der-waals"),
  "redlich-kwong": cubicEntry("redlich-kwong"),
  "soave-redlich-kwong": cubicEntry("soave-redlich-kwong"),
  "peng-robinson-1976": cubicEntry("peng-robinson-1976"),
  "peng-robinson-1978": cubicEntry("peng-robinson-1978"),
  "gerg-2008": {
    id: "gerg-2008",
    title: "GERG-2008",
    source: "Kunz and Wagner, J. Chem. Eng. Data 57 (2012) 3032-3091; ISO 20765-2",
    build: buildGerg,
  },
  reference: {
    id: "reference",
    title: "Reference equation of the pure fluid",
    source: "one publication a fluid, named in the result",
    build: buildReference,
  },
};

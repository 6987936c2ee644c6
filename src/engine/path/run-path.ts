import type { PathCase, PathResult, StatePoint } from "../cases/path-case";
import { createFluidModel } from "../eos/create-fluid-model";
import type { FluidModel } from "../eos/fluid-model";
import { stateWarnings } from "../eos/state-warnings";
import { EngineError } from "../errors";
import type { Equilibrium } from "../flash/equilibrium";
import { flashPT } from "../flash/flash-pt";
import { phaseWarnings } from "../flash/phase-warnings";
import { summarise } from "../flash/summarise";
import { solidWarnings } from "../solids/solid-warnings";
import { changeOfState } from "./change-of-state";

/** kind "path". Throws EngineError with the path of the field. */
export function runPath(document: PathCase): PathResult {
  const model = createFluidModel(document.fluid);
  const from = equilibriumAt(model, document.from, "from");
  const to = equilibriumAt(model, document.to, "to");
  return {
    format: "ebbmark-result/1",
    kind: "path",
    ...changeOfState(model, from, to),
    from: summarise(model, from),
    to: summarise(model, to),
    warnings: [
      ...phaseWarnings(model, from),
      ...phaseWarnings(model, to),
      ...solidWarnings(model, from),
      ...solidWarnings(model, to),
      ...stateWarnings(model, [from.temperatureK, to.temperatureK]),
    ],
  };
}

function equilibriumAt(model: FluidModel, point: StatePoint, path: string): Equilibrium {
  try {
    return flashPT(model, point);
  } catch (error) {
    throw error instanceof EngineError ? error.at(error.path ? `${path}.${error.path}` : path) : error;
  }
}

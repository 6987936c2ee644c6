import type { FluidSpec } from "../cases/fluid-spec";
import { EngineError } from "../errors";
import type { FluidModel } from "./fluid-model";

/**
 * The fluid of a case document as a model: library ids, pseudo-components and custom constants resolved, interaction
 * parameters looked up. Throws EngineError "invalid-case" with the path of the field, or "not-applicable".
 */
export function createFluidModel(fluid: FluidSpec): FluidModel {
  throw new EngineError("not-applicable", `equation ${fluid.equation} is not available`, {}, "fluid.equation");
}

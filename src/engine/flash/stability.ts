import { EngineError } from "../errors";
import type { FluidModel, Stability } from "../eos/fluid-model";

/** Placeholder until the next commit. */
export function testStability(model: FluidModel, T: number, p: number, z: ArrayLike<number>): Stability {
  throw new EngineError("not-applicable", "stability", { T, p, n: z.length, c: model.componentIds.length });
}

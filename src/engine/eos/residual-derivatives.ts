import type { ResidualDerivatives } from "./fluid-model";

/** Scratch for one evaluation of F = A_res/(R T) of a mixture of `count` components. */
export function createResidualDerivatives(count: number): ResidualDerivatives {
  return {
    F: 0,
    FT: 0,
    FV: 0,
    FTT: 0,
    FTV: 0,
    FVV: 0,
    Fn: new Float64Array(count),
    FnT: new Float64Array(count),
    FnV: new Float64Array(count),
    Fnn: new Float64Array(count * count),
  };
}

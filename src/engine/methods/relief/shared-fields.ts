import { EngineError } from "../../errors";
import { number } from "../field";

/** Kd and Kc, with the coefficient the standard takes before a device is chosen. */
export const sizingFactors = (dischargeCoefficient: number) => ({
  dischargeCoefficient: number("K_d", "Effective coefficient of discharge", "", {
    above: 0,
    max: 1,
    default: dischargeCoefficient,
  }),
  combinationFactor: number("K_c", "Combination factor, 0.9 behind a rupture disk without a certified one", "", {
    above: 0,
    max: 1,
    default: 1,
  }),
});

/** Nothing flows against a back pressure that is not below the inlet. */
export function belowInlet<G extends { relievingPressurePa: number; backPressurePa: number }>(given: G): G {
  if (given.backPressurePa < given.relievingPressurePa) return given;
  throw new EngineError(
    "invalid-case",
    `The back pressure must be below the relieving pressure, ${given.relievingPressurePa} Pa.`,
    {},
    "inputs.backPressurePa",
  );
}

/**
 * What a high-pressure side sends through an opening into the protected system at its relieving pressure: a level valve that lets gas by, a
 * control valve that fails open, a broken tube. The stream arrives by throttling, at constant enthalpy.
 *
 * Source   API Std 521: gas blow-by through the wide-open valve; tube rupture as twice the flow of one open end
 */
import type { FeedState, PassageSpec } from "../../cases/relief-case";
import { EngineError } from "../../errors";
import type { Equilibrium } from "../../flash/equilibrium";
import { flashPH } from "../../flash/flash-ph";
import { flashPT } from "../../flash/flash-pt";
import { valveGasFlow } from "../../flow/control-valve";
import { equilibriumNozzle } from "../../flow/equilibrium-nozzle";
import type { Relieving, ReliefStream } from "../relief-stream";

export function passage(
  relieving: Relieving,
  upstream: FeedState,
  flowOf: (high: Equilibrium) => number,
  { basis, leavesKgPerS }: { basis: string; leavesKgPerS: number },
): ReliefStream {
  const { fluid, relievingPressurePa } = relieving;
  if (upstream.pressurePa <= relievingPressurePa) {
    throw new EngineError(
      "invalid-case",
      `The high-pressure side must be above the relieving pressure, ${Math.round(relievingPressurePa)} Pa, or nothing comes through.`,
      {},
      "relief.upstream.pressurePa",
    );
  }
  const high = flashPT(fluid, upstream);
  const comes = flowOf(high);
  const massFlowKgPerS = comes - leavesKgPerS;
  if (!(massFlowKgPerS > 0)) {
    throw new EngineError(
      "invalid-case",
      `What comes through, ${comes.toPrecision(4)} kg/s, is no more than what still leaves. There is nothing to relieve.`,
      {},
      "relief.leavesKgPerS",
    );
  }
  return {
    massFlowKgPerS,
    basis,
    state: flashPH(fluid, { pressurePa: relievingPressurePa, enthalpyJPerMol: high.enthalpyJPerMol }),
    composition: fluid.feed,
    warnings: [],
  };
}

/** Flow [kg/s] through the opening from the high side. */
export function flowThrough(relieving: Relieving, through: PassageSpec): (high: Equilibrium) => number {
  const { fluid, relievingPressurePa } = relieving;
  return (high) => {
    if (through.path === "orifice")
      return (Math.PI / 4) * through.diameterM ** 2 * through.dischargeCoefficient * flux(relieving, high);
    if (high.phases.length !== 1 || high.phase === "liquid") {
      throw new EngineError(
        "not-applicable",
        "The control valve is computed for gas, and the high-pressure side holds liquid. Give its opening as an orifice.",
        {},
        "relief.through",
      );
    }
    const cp = fluid.idealGas(high.temperatureK, high.pressurePa, fluid.feed).heatCapacityPJPerMolK;
    return valveGasFlow({
      upstreamPressurePa: high.pressurePa,
      downstreamPressurePa: relievingPressurePa,
      densityKgPerM3: high.phases[0]!.state.densityKgPerM3,
      gamma: cp / (cp - fluid.gasConstantJPerMolK),
      cv: through.cv,
      xt: through.xt,
    }).massFlowKgPerS;
  };
}

/** Both ends of a broken tube [kg/s]. */
export const brokenTube =
  (relieving: Relieving, insideDiameterM: number, dischargeCoefficient: number) =>
  (high: Equilibrium): number =>
    2 * dischargeCoefficient * (Math.PI / 4) * insideDiameterM ** 2 * flux(relieving, high);

const flux = ({ fluid, relievingPressurePa }: Relieving, high: Equilibrium): number =>
  equilibriumNozzle(fluid, high, fluid.feed, relievingPressurePa).massFluxKgPerM2S;

/**
 * What passes the opening, fully open, for a stream at rest before it.
 *
 * An orifice passes C_d A G with G from the nozzle. Frozen flow means a vapour that stays vapour; a stream that is liquid or two-phase has no
 * such branch and is taken in equilibrium, which a warning says. A control valve is computed for gas.
 */
import type { FluidModel } from "../../eos/fluid-model";
import { EngineError } from "../../errors";
import { valveGasFlow } from "../../flow/control-valve";
import { createEquilibriumHints, equilibriumNozzle } from "../../flow/equilibrium-nozzle";
import { frozenNozzle } from "../../flow/frozen-nozzle";
import type { OrificeRelease, ReleaseSpec, ValveRelease } from "../blowdown-case";
import type { LeavingStream } from "./leaving-stream";

export type Passed = { rateKgPerS: number; throatPressurePa: number; throatTemperatureK: number; choked: boolean };
export type Opening = (stream: LeavingStream) => Passed;

export function makeOpening(fluid: FluidModel, release: ReleaseSpec): Opening {
  if (release.path === "orifice") return orifice(fluid, release);
  if (release.path === "valve") return controlValve(fluid, release);
  throw new RangeError("a bore that is searched for is settled before the run");
}

function orifice(
  fluid: FluidModel,
  { diameterM, dischargeCoefficient, backPressurePa, flowModel, from }: OrificeRelease,
): Opening {
  const areaM2 = (dischargeCoefficient * Math.PI * diameterM ** 2) / 4;
  // Vapour, liquid and mixture each have a throat of their own from which the next search starts.
  const hints = [createEquilibriumHints(), createEquilibriumHints(), createEquilibriumHints()] as const;
  return (stream) => {
    const near = stream.phase ? hints[stream.isLiquid ? 1 : 0] : hints[2];
    const frozen = flowModel === "frozen" && stream.phase && !(from !== "vapour" && stream.isLiquid);
    const flow =
      frozen && stream.phase
        ? frozenNozzle(fluid, stream.phase, stream.composition, backPressurePa, near.frozen)
        : equilibriumNozzle(fluid, stream.equilibrium(), stream.composition, backPressurePa, near);
    const { massFluxKgPerM2S, ...throat } = flow;
    return { rateKgPerS: areaM2 * massFluxKgPerM2S, ...throat };
  };
}

function controlValve(fluid: FluidModel, { cv, xt, backPressurePa }: ValveRelease): Opening {
  return ({ phase, isLiquid, composition, temperatureK, pressurePa }) => {
    if (!phase || isLiquid) {
      throw new EngineError(
        "not-applicable",
        "Liquid or two phases reach the control valve, which is computed for gas only. Take the outlet from the vapour, or use an orifice.",
        {},
        "release.path",
      );
    }
    const { heatCapacityPJPerMolK: cp } = fluid.idealGas(temperatureK, pressurePa, composition);
    const flow = valveGasFlow({
      upstreamPressurePa: pressurePa,
      downstreamPressurePa: backPressurePa,
      densityKgPerM3: phase.densityKgPerM3,
      gamma: cp / (cp - fluid.gasConstantJPerMolK),
      cv,
      xt,
    });
    return {
      rateKgPerS: flow.massFlowKgPerS,
      throatPressurePa: flow.choked ? flow.pressureAtLimitPa : backPressurePa,
      throatTemperatureK: temperatureK,
      choked: flow.choked,
    };
  };
}

/**
 * What passes the opening, fully open, for a stream at rest before it.
 *
 * An orifice or a relief device passes C_d A G with G from the nozzle. Frozen flow means a vapour that stays vapour; a stream that is liquid or
 * two-phase has no such branch and is taken in equilibrium, which a warning says. A control valve is computed for gas. With a tail pipe the pressure
 * behind the opening is the one that the pipe needs at its inlet to pass what the opening passes.
 */
import type { FluidModel } from "../../eos/fluid-model";
import { EngineError } from "../../errors";
import { valveGasFlow } from "../../flow/control-valve";
import { createEquilibriumHints, equilibriumNozzle } from "../../flow/equilibrium-nozzle";
import { frozenNozzle } from "../../flow/frozen-nozzle";
import { behindTailPipe } from "../../flow/tail-pipe";
import type { FlowModel, OutletPlace, ReleaseSpec, ValveRelease } from "../blowdown-case";
import type { LeavingStream } from "./leaving-stream";

export type Passed = {
  rateKgPerS: number;
  throatPressurePa: number;
  throatTemperatureK: number;
  choked: boolean;
  /** Directly behind the opening. */
  backPressurePa: number;
};
export type Opening = (stream: LeavingStream) => Passed;
type Through = (stream: LeavingStream, backPressurePa: number) => Passed;

export function makeOpening(fluid: FluidModel, release: ReleaseSpec, place = "release"): Opening {
  const through = makeThrough(fluid, release, place);
  const { backPressurePa, tailPipe } = release;
  if (!tailPipe) return (stream) => through(stream, backPressurePa);
  return (stream) => {
    if (!stream.phase || stream.isLiquid) {
      throw new EngineError(
        "not-applicable",
        "Liquid or two phases reach the tail pipe, which is computed for gas only. Take the outlet from the vapour, or leave the pipe out and state a back pressure.",
        {},
        `${place}.tailPipe`,
      );
    }
    return behindTailPipe(fluid, stream, tailPipe, backPressurePa, (behindPa) => through(stream, behindPa));
  };
}

function makeThrough(fluid: FluidModel, release: ReleaseSpec, place: string): Through {
  switch (release.path) {
    case "orifice":
      return nozzle(fluid, (release.dischargeCoefficient * Math.PI * release.diameterM ** 2) / 4, release);
    case "relief":
      return nozzle(fluid, release.dischargeCoefficient * release.areaM2, release);
    case "valve":
      return controlValve(fluid, release, place);
    case "sized":
      throw new RangeError("a bore that is searched for is settled before the run");
  }
}

function nozzle(fluid: FluidModel, areaM2: number, { flowModel, from }: { flowModel: FlowModel; from: OutletPlace }): Through {
  // Vapour, liquid and mixture each have a throat of their own from which the next search starts.
  const hints = [createEquilibriumHints(), createEquilibriumHints(), createEquilibriumHints()] as const;
  return (stream, backPressurePa) => {
    const near = stream.phase ? hints[stream.isLiquid ? 1 : 0] : hints[2];
    const frozen = flowModel === "frozen" && stream.phase && !(from !== "vapour" && stream.isLiquid);
    const flow =
      frozen && stream.phase
        ? frozenNozzle(fluid, stream.phase, stream.composition, backPressurePa, near.frozen)
        : equilibriumNozzle(fluid, stream.equilibrium(), stream.composition, backPressurePa, near);
    return {
      rateKgPerS: areaM2 * flow.massFluxKgPerM2S,
      throatPressurePa: flow.throatPressurePa,
      throatTemperatureK: flow.throatTemperatureK,
      choked: flow.choked,
      backPressurePa,
    };
  };
}

function controlValve(fluid: FluidModel, { cv, xt }: ValveRelease, place: string): Through {
  return ({ phase, isLiquid, composition, temperatureK, pressurePa }, backPressurePa) => {
    if (!phase || isLiquid) {
      throw new EngineError(
        "not-applicable",
        "Liquid or two phases reach the control valve, which is computed for gas only. Take the outlet from the vapour, or use an orifice.",
        {},
        `${place}.path`,
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
      backPressurePa,
    };
  };
}

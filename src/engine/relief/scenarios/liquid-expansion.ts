/** Blocked-in liquid that is heated: the volume it gains has to leave. α = (1/v)(∂v/∂T)_p and c_p from the equation of state. */
import type { Relieving, ReliefStream } from "../relief-stream";
import { expansionFlowM3PerS } from "../thermal-expansion";
import { liquidAt } from "./boiling";

export function liquidExpansion(relieving: Relieving, heatW: number, temperatureK: number, basis: string): ReliefStream {
  const { fluid } = relieving;
  const state = liquidAt(relieving, temperatureK);
  const phase = state.phases[0]!.state; // one liquid, see liquidAt
  const expansionPerK = -phase.pressureByTemperature / (phase.molarVolumeM3PerMol * phase.pressureByVolume);
  const heatCapacity = phase.heatCapacityPJPerMolK / fluid.mixtureMolarMass(fluid.feed);
  const flow = expansionFlowM3PerS(expansionPerK, heatW, phase.densityKgPerM3, heatCapacity);
  return {
    massFlowKgPerS: flow * phase.densityKgPerM3,
    basis,
    heatW,
    state,
    composition: fluid.feed,
    warnings: [
      "A nominal device is usual for thermal expansion; the area may be far smaller than the smallest standard orifice.",
    ],
  };
}

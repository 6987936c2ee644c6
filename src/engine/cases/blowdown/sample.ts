/** One row of the series, copied out of the instant it was taken at. */
import { throttleTemperature } from "../../flow/throttle";
import { levelAtVolume } from "../../vessel/geometry";
import type { Balance } from "./balance";
import type { KeptStep } from "./dense-run";
import type { Segment } from "./integrate-run";

export type Sample = {
  timeS: number;
  pressurePa: number;
  temperatureK: number;
  wallTemperatureK: number | undefined;
  massKg: number;
  ventRateKgPerS: number;
  ventedMassKg: number;
  ventedEnergyJ: number;
  vapourMoleFraction: number;
  liquidVolumeM3: number;
  throatTemperatureK: number;
  /** Behind the opening, at the back pressure. */
  outletTemperatureK: number;
};

export function sampleAt(balance: Balance, segment: Segment, step: KeptStep, t: number): Sample {
  const { y, instant } = balance.within(segment, step, t);
  const { contents, flow, ventRateKgPerS, heat } = instant;
  return {
    timeS: t,
    pressurePa: contents.pressurePa,
    temperatureK: contents.temperatureK,
    wallTemperatureK: heat.innerSurfaceK,
    massKg: contents.totalMolesMol * balance.model.fluid.mixtureMolarMass(contents.composition),
    ventRateKgPerS,
    ventedMassKg: balance.ventedMassKg(y),
    ventedEnergyJ: balance.ventedEnergyJ(y),
    vapourMoleFraction: contents.vapourMoleFraction,
    liquidVolumeM3: contents.liquidVolumeM3,
    throatTemperatureK: flow.throatTemperatureK,
    outletTemperatureK: throttleTemperature(balance.model.fluid, flow, flow.composition, balance.model.backPressurePa),
  };
}

export const levelOf = (balance: Balance, sample: Sample): number | undefined =>
  levelAtVolume(balance.model.vessel, sample.liquidVolumeM3);

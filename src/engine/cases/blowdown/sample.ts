/** One row of the series, read off the fitted run. */
import { levelAtVolume } from "../../vessel/geometry";
import type { Balance } from "./balance";
import { indexOf, pieceAt, type FitPiece, type Quantity } from "./run-fit";

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

export function sampleOf(piece: FitPiece, t: number, hasWall: boolean): Sample {
  const read = (quantity: Quantity): number => pieceAt(piece, indexOf[quantity], t);
  return {
    timeS: t,
    pressurePa: read("pressurePa"),
    temperatureK: read("temperatureK"),
    wallTemperatureK: hasWall ? read("wallTemperatureK") : undefined,
    massKg: read("massKg"),
    ventRateKgPerS: read("ventRateKgPerS"),
    ventedMassKg: read("ventedMassKg"),
    ventedEnergyJ: read("ventedEnergyJ"),
    vapourMoleFraction: Math.min(Math.max(read("vapourMoleFraction"), 0), 1),
    liquidVolumeM3: Math.max(read("liquidVolumeM3"), 0),
    throatTemperatureK: read("throatTemperatureK"),
    outletTemperatureK: read("outletTemperatureK"),
  };
}

export const levelOf = (balance: Balance, sample: Sample): number | undefined =>
  levelAtVolume(balance.model.vessel, sample.liquidVolumeM3);

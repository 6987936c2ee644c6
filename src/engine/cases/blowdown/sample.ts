/** One row of the series, read off the fitted run. */
import { levelTable } from "../../vessel/level-table";
import type { Balance } from "./balance";
import { indexOf, quantities, readPiece, type FitPiece } from "./run-fit";

export type Sample = {
  timeS: number;
  pressurePa: number;
  /** Of vapour and liquid the colder, where they differ. */
  temperatureK: number;
  vapourTemperatureK: number;
  liquidTemperatureK: number;
  /** Inner surface that the vapour touches, and that the liquid touches. */
  wallTemperatureK: number | undefined;
  liquidWallTemperatureK: number | undefined;
  massKg: number;
  ventRateKgPerS: number;
  ventedMassKg: number;
  ventedEnergyJ: number;
  vapourMoleFraction: number;
  liquidVolumeM3: number;
  throatTemperatureK: number;
  /** Behind the opening, at the back pressure. */
  outletTemperatureK: number;
  /** Directly behind the opening that passes most. */
  backPressurePa: number;
};

const scratch = new Float64Array(quantities.length);

export function sampleOf(piece: FitPiece, t: number, hasWall: boolean): Sample {
  const read = readPiece(piece, t, scratch);
  return {
    timeS: t,
    pressurePa: read[indexOf.pressurePa]!,
    temperatureK: read[indexOf.temperatureK]!,
    vapourTemperatureK: read[indexOf.vapourTemperatureK]!,
    liquidTemperatureK: read[indexOf.liquidTemperatureK]!,
    liquidWallTemperatureK: hasWall ? read[indexOf.liquidWallTemperatureK]! : undefined,
    wallTemperatureK: hasWall ? read[indexOf.wallTemperatureK]! : undefined,
    massKg: read[indexOf.massKg]!,
    ventRateKgPerS: read[indexOf.ventRateKgPerS]!,
    ventedMassKg: read[indexOf.ventedMassKg]!,
    ventedEnergyJ: read[indexOf.ventedEnergyJ]!,
    vapourMoleFraction: Math.min(Math.max(read[indexOf.vapourMoleFraction]!, 0), 1),
    liquidVolumeM3: Math.max(read[indexOf.liquidVolumeM3]!, 0),
    throatTemperatureK: read[indexOf.throatTemperatureK]!,
    outletTemperatureK: read[indexOf.outletTemperatureK]!,
    backPressurePa: read[indexOf.backPressurePa]!,
  };
}

export const levelOf = (balance: Balance, sample: Sample): number | undefined =>
  levelTable(balance.model.vessel)?.at(sample.liquidVolumeM3).levelM;

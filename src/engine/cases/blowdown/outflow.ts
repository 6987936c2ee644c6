/** What leaves the vessel at one instant with the valve fully open: the streams through the opening, added up. */
import type { FluidModel } from "../../eos/fluid-model";
import type { Passed, Opening } from "./opening";
import type { LeavingStream } from "./leaving-stream";

export type Outflow = {
  rateKgPerS: number;
  /** ṅ_i [mol/s] */
  molesPerS: Float64Array;
  /** Stagnation enthalpy that leaves [W]. */
  enthalpyW: number;
  /** The part of both that is vapour where it leaves the vessel. */
  vapourMolesPerS: Float64Array;
  vapourEnthalpyW: number;
  /** State before the opening, mixed: for the temperature behind it. */
  temperatureK: number;
  pressurePa: number;
  enthalpyJPerMol: number;
  composition: Float64Array;
  /** Of the stream with the larger share. */
  throatPressurePa: number;
  throatTemperatureK: number;
  choked: boolean;
  /** Directly behind the opening. */
  backPressurePa: number;
};

export function outflow(fluid: FluidModel, opening: Opening, streams: LeavingStream[]): Outflow {
  const molesPerS = new Float64Array(fluid.componentIds.length);
  const vapourMolesPerS = new Float64Array(fluid.componentIds.length);
  let vapourEnthalpyW = 0;
  let rateKgPerS = 0;
  let enthalpyW = 0;
  let total = 0;
  let main: { stream: LeavingStream; passed: Passed } | undefined;
  for (const stream of streams) {
    const passed = opening(stream);
    const rate = stream.share * passed.rateKgPerS;
    const moles = rate / fluid.mixtureMolarMass(stream.composition);
    rateKgPerS += rate;
    enthalpyW += moles * stream.enthalpyJPerMol;
    total += moles;
    const isVapour = stream.phase !== undefined && !stream.isLiquid;
    if (isVapour) vapourEnthalpyW += moles * stream.enthalpyJPerMol;
    for (let i = 0; i < molesPerS.length; i++) {
      const amount = moles * stream.composition[i]!;
      molesPerS[i] = molesPerS[i]! + amount;
      if (isVapour) vapourMolesPerS[i] = vapourMolesPerS[i]! + amount;
    }
    if (!main || stream.share > main.stream.share) main = { stream, passed };
  }
  if (!main) throw new RangeError("nothing leaves");
  const { stream, passed } = main;
  const flows = total > 0;
  return {
    rateKgPerS,
    molesPerS,
    enthalpyW,
    vapourMolesPerS,
    vapourEnthalpyW,
    temperatureK: stream.temperatureK,
    pressurePa: stream.pressurePa,
    enthalpyJPerMol: flows ? enthalpyW / total : stream.enthalpyJPerMol,
    composition: flows && streams.length > 1 ? molesPerS.map((moles) => moles / total) : stream.composition,
    throatPressurePa: passed.throatPressurePa,
    throatTemperatureK: passed.throatTemperatureK,
    choked: passed.choked,
    backPressurePa: passed.backPressurePa,
  };
}

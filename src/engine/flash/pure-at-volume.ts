import type { FluidModel, PhaseState } from "../eos/fluid-model";
import { EngineError } from "../errors";
import { assemble } from "./assemble";
import { attempted } from "./attempted";
import type { Equilibrium } from "./equilibrium";
import { insideDome, saturatedMix } from "./pure-volume";
import { onlyComponent } from "./saturation-pure";
import { solveAtVolume, type TwoPhaseVolumes, type VolumeTarget } from "./two-phase-volume";
import { assembleOne, assembleTwo } from "./volume-phases";

export type HeldTarget = VolumeTarget & { hold: "energy" | "entropy" };

/** One component at given volume and energy (entropy): one phase outside its dome, the lever rule and a last Newton inside. */
export function pureAtVolume(
  model: FluidModel,
  target: HeldTarget,
  z: ArrayLike<number>,
  single: PhaseState | undefined,
  state: TwoPhaseVolumes,
): Equilibrium {
  const v = target.molarVolume;
  // A one-phase state in tension is no answer; nor is one so cold that its saturation pressure is beyond all numbers.
  const outside = single && single.pressurePa > 0 && attempted(() => insideDome(model, single.temperatureK, v, z) === undefined);
  if (outside) return assembleOne(model, single, z);
  const start = domeStart(model, v, z, single?.temperatureK);
  if (start === undefined) {
    throw new EngineError("no-convergence", "no equilibrium state has this energy at this volume", {
      molarVolumeM3PerMol: v,
      value: target.value,
    });
  }
  const { saturation, quality } = saturatedMix(model, z, { v, value: target.value, kind: target.hold }, start);
  const index = onlyComponent(z);
  state.v.fill(0);
  state.l.fill(0);
  state.v[index] = quality;
  state.l[index] = 1 - quality;
  state.temperatureK = saturation.temperatureK;
  state.vapourVolume = quality * saturation.vapourVolume;
  state.liquidVolume = v - state.vapourVolume;
  if (quality > 1e-12 && quality < 1 - 1e-12 && solveAtVolume(model, z, target, state)) return assembleTwo(model, state);
  return assemble(model, saturation.temperatureK, saturation.pressurePa, [
    { moleFraction: quality, composition: z, molarVolume: saturation.vapourVolume },
    { moleFraction: 1 - quality, composition: z, molarVolume: saturation.liquidVolume },
  ]);
}

/** A temperature at which v lies inside the dome: from near the critical one downwards. */
function domeStart(model: FluidModel, v: number, z: ArrayLike<number>, near: number | undefined): number | undefined {
  const Tc = model.criticalTemperaturesK[onlyComponent(z)]!;
  const candidates: number[] = [];
  for (let reduced = 0.98; reduced > 0.25; reduced -= 0.06) candidates.push(reduced * Tc);
  for (const reduced of [0.99, 0.995, 0.998, 0.9995]) candidates.push(reduced * Tc);
  if (near !== undefined && near < Tc) candidates.push(near);
  return candidates.find((T) => T > model.temperatureRangeK[0] && attempted(() => insideDome(model, T, v, z)) !== undefined);
}

import type { Equilibrium } from "./equilibrium";
import type { ThreePhaseVolumes } from "./three-phase-volume";
import type { TwoPhaseVolumes } from "./two-phase-volume";

export function createTwoPhaseVolumes(count: number): TwoPhaseVolumes {
  return {
    temperatureK: 0,
    pressurePa: 0,
    v: new Float64Array(count),
    l: new Float64Array(count),
    vapourVolume: 0,
    liquidVolume: 0,
  };
}

/**
 * A first guess for feed z and molar volume from a two-phase equilibrium near by. What is carried over is intensive (K-values,
 * vapour fraction, molar volume of the liquid), so a feed that has since lost a third of its moles still fits.
 */
export function seedFrom(near: Equilibrium, z: ArrayLike<number>, molarVolume: number, out: TwoPhaseVolumes): boolean {
  const [light, dense, third] = near.phases;
  if (!light || !dense || third) return false;
  let beta = light.moleFraction;
  const liquidVolume = dense.state.molarVolumeM3PerMol;
  const vapourVolume = light.state.molarVolumeM3PerMol;
  // The vapour fraction that fits the volume, if there is one, beats the old one.
  const fitted = (molarVolume - liquidVolume) / (vapourVolume - liquidVolume);
  if (fitted > 0 && fitted < 1) beta = fitted;
  if (!(beta > 0 && beta < 1)) return false;
  for (let i = 0; i < z.length; i++) {
    if (!(z[i]! > 0)) {
      out.v[i] = 0;
      out.l[i] = 0;
      continue;
    }
    const K = Math.exp(dense.lnFugacityCoefficients[i]! - light.lnFugacityCoefficients[i]!);
    const x = z[i]! / (1 + beta * (K - 1));
    out.l[i] = (1 - beta) * x;
    out.v[i] = beta * K * x;
    // whichever is larger is the remainder, so the two always add up to z
    if (out.v[i]! < out.l[i]!) out.l[i] = z[i]! - out.v[i]!;
    else out.v[i] = z[i]! - out.l[i]!;
  }
  let nl = 0;
  for (let i = 0; i < z.length; i++) nl += out.l[i]!;
  out.temperatureK = near.temperatureK;
  out.pressurePa = near.pressurePa;
  out.liquidVolume = nl * liquidVolume;
  out.vapourVolume = molarVolume - out.liquidVolume;
  return out.vapourVolume > 0;
}

/** As `seedFrom`, from an equilibrium of three phases: each component shared out as it was, the liquids at their molar volumes. */
export function seedThreeFrom(near: Equilibrium, z: ArrayLike<number>, molarVolume: number, out: ThreePhaseVolumes): boolean {
  const { phases } = near;
  if (phases.length !== 3) return false;
  const totals = [0, 0, 0];
  for (let i = 0; i < z.length; i++) {
    let held = 0;
    for (const { moleFraction, composition } of phases) held += moleFraction * composition[i]!;
    for (let k = 0; k < 3; k++) {
      const share = held > 0 ? (phases[k]!.moleFraction * phases[k]!.composition[i]!) / held : 1 / 3;
      out.moles[k]![i] = z[i]! > 0 ? Math.max(z[i]! * share, 1e-290) : 0;
      totals[k] = totals[k]! + out.moles[k]![i]!;
    }
  }
  out.temperatureK = near.temperatureK;
  out.pressurePa = near.pressurePa;
  let sum = 0;
  for (let k = 0; k < 3; k++) {
    out.volumes[k] = totals[k]! * phases[k]!.state.molarVolumeM3PerMol;
    sum += out.volumes[k]!;
  }
  const light = molarVolume - (sum - out.volumes[0]!);
  if (light > 0.2 * out.volumes[0]!) out.volumes[0] = light;
  else for (let k = 0; k < 3; k++) out.volumes[k] = (out.volumes[k]! * molarVolume) / sum;
  return true;
}

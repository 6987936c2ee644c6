import type { FluidModel } from "../eos/fluid-model";
import { assemble } from "./assemble";
import type { Equilibrium } from "./equilibrium";

/** The two states found nearest on either side of a target. */
export interface Sides {
  below?: Equilibrium;
  above?: Equilibrium;
}

/** Phases this alike are one phase of two states on either side of a jump. */
const alike = 1e-3;

/**
 * Where a mixture of few components has a phase more than its pressure (or temperature) leaves room for, its energy or volume jumps at
 * one temperature (pressure) while both sides are in equilibrium with each other: the state between is the two sides together.
 *
 * share    part of the matter in the state `b`
 * Returns  the merged equilibrium; undefined where the sides are not neighbours
 */
export function lever(model: FluidModel, a: Equilibrium, b: Equilibrium, share: number): Equilibrium | undefined {
  if (!(share >= 0 && share <= 1)) return undefined;
  const near = Math.abs(a.temperatureK / b.temperatureK - 1) < 1e-8 && Math.abs(Math.log(a.pressurePa / b.pressurePa)) < 1e-7;
  if (!near) return undefined;
  const merged: { moleFraction: number; composition: Float64Array; molarVolume: number }[] = [];
  for (const [state, weight] of [
    [a, 1 - share],
    [b, share],
  ] as const) {
    for (const { moleFraction, composition, state: phase } of state.phases) {
      const amount = weight * moleFraction;
      const twin = merged.find(
        (other) =>
          Math.abs(other.molarVolume / phase.molarVolumeM3PerMol - 1) < alike &&
          other.composition.every((x, i) => Math.abs(x - composition[i]!) < alike),
      );
      if (twin) twin.moleFraction += amount;
      else if (amount > 0) merged.push({ moleFraction: amount, composition, molarVolume: phase.molarVolumeM3PerMol });
    }
  }
  const found = assemble(model, a.temperatureK, a.pressurePa, merged);
  return merged.length > 3 || a.missingPhase || b.missingPhase ? { ...found, missingPhase: true } : found;
}

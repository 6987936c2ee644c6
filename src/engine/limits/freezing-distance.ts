/**
 * How many kelvins a fluid is from freezing at its pressure and composition.
 *
 * The solid criterion of the run (`cases/blowdown/solid-check.ts`) is searched along falling temperature; negative where it is met already.
 * Returns  kelvins, at most `farthestK`
 */
import type { Contents } from "../cases/blowdown/contents";
import { solidMargin, type SolidCurve } from "../cases/blowdown/solid-check";
import type { FluidModel } from "../eos/fluid-model";
import { bracketedRoot } from "../ode/bracketed-root";

export const farthestK = 100;
/** No solid of a natural gas forms above this and is missed; equations are not evaluated below. */
const coldestK = 60;

/** A fluid warmer than every triple point by more than this is not searched. */
export function freezingDistanceK(fluid: FluidModel, contents: Contents, curves: readonly SolidCurve[]): number {
  const T = contents.temperatureK;
  const warmest = Math.max(...curves.map((curve) => curve.triplePointK));
  if (curves.length === 0 || T - warmest >= farthestK) return farthestK;
  const marginAt = (temperatureK: number): number => Math.tanh(solidMargin(fluid, { ...contents, temperatureK }, curves));
  const here = marginAt(T);
  const other = here > 0 ? Math.max(T - farthestK, coldestK, 1.05 * fluid.temperatureRangeK[0]) : warmest + 1;
  if (other >= T === here > 0) return here > 0 ? farthestK : 0;
  const there = marginAt(other);
  if (!Number.isFinite(here * there) || here > 0 === there > 0) return here > 0 ? farthestK : T - other;
  return T - bracketedRoot(marginAt, { a: T, fa: here, b: other, fb: there }, 1e-6 * T);
}

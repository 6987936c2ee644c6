import { EngineError } from "../errors";
import type { FluidModel } from "../eos/fluid-model";
import { assemble } from "./assemble";
import type { Equilibrium } from "./equilibrium";
import { testStability } from "./stability";
import { minimiseGibbs } from "./minimise-gibbs";
import { createTwoPhaseWork, solveTwoPhase, splitOffTrial, type TwoPhaseOutcome, type TwoPhaseWork } from "./two-phase-pt";
import { wilsonLnK } from "./wilson";

/**
 * Equilibrium at given temperature and pressure: one phase, or vapour and liquid.
 *
 * A two-phase answer is accepted only when its Gibbs energy is below that of the homogeneous phase; one phase is accepted only
 * from a stability test that converged. A pure fluid is one phase here at every pressure but its saturation pressure.
 *
 * z        mole fractions, in the order of the model's components; defaults to the feed
 * seed     an equilibrium near by: its K-values are tried first
 * Throws   EngineError "no-convergence" when the feed is unstable but no split could be found
 */
export function flashPT(
  model: FluidModel,
  { temperatureK: T, pressurePa: p }: { temperatureK: number; pressurePa: number },
  z: ArrayLike<number> = model.feed,
  seed?: Equilibrium,
): Equilibrium {
  requireState(model, T, p);
  const work = flashWork(z.length);
  const split = findSplit(model, T, p, z, work, seed);
  if (split !== "one-phase") {
    const found = assemble(model, T, p, [
      { moleFraction: work.beta, composition: work.vapour.composition, molarVolume: work.vapour.molarVolume },
      { moleFraction: 1 - work.beta, composition: work.liquid.composition, molarVolume: work.liquid.molarVolume },
    ]);
    return split === "third-phase" ? { ...found, thirdPhase: true } : found;
  }
  model.residual.setComposition(z);
  const molarVolume = model.residual.volumeAtPressure(T, p, "stable");
  return assemble(model, T, p, [{ moleFraction: 1, composition: z, molarVolume }]);
}

type Split = "one-phase" | "two-phase" | "third-phase";

/**
 * Leaves the split of lowest Gibbs energy that was found in `work`. A split is tested like any phase: where one of its own phases
 * would split again, the new phase is tried as a partner of the feed, and what still fails the test is reported as three phases.
 */
export function findSplit(
  model: FluidModel,
  T: number,
  p: number,
  z: ArrayLike<number>,
  work: TwoPhaseWork,
  seed?: Equilibrium,
): Split {
  if (!convergedSplit(model, T, p, z, work, seed)) return "one-phase";
  for (let round = 0; round < 3; round++) {
    const test = testStability(model, T, p, work.liquid.composition, { partner: work.vapour.composition });
    if (test.tangentPlaneDistance > thirdPhaseDistance) return "two-phase";
    const before = work.gibbs;
    const kept = [work.v.slice(), work.l.slice()] as const;
    const better = splitOffTrial(model, T, p, z, test.trialComposition, work) === "converged" && work.gibbs < before - 1e-12;
    if (!better) {
      work.v.set(kept[0]);
      work.l.set(kept[1]);
      minimiseGibbs(model, T, p, z, work);
      return "third-phase";
    }
  }
  return "third-phase";
}

/** A tangent-plane distance this small is the round-off of two phases that have just been found equal. */
const thirdPhaseDistance = -1e-7;

function convergedSplit(
  model: FluidModel,
  T: number,
  p: number,
  z: ArrayLike<number>,
  work: TwoPhaseWork,
  seed?: Equilibrium,
): boolean {
  let active = 0;
  for (let i = 0; i < z.length; i++) if (z[i]! > 0) active++;
  if (active === 1) return false;
  const accepted = (outcome: TwoPhaseOutcome) => outcome === "converged" && lowersGibbs(model, T, p, z, work);

  const [light, dense] = seed?.phases ?? [];
  if (light && dense) {
    for (let i = 0; i < z.length; i++) {
      work.lnK[i] = z[i]! > 0 ? dense.lnFugacityCoefficients[i]! - light.lnFugacityCoefficients[i]! : 0;
    }
    work.beta = light.moleFraction;
    if (accepted(solveTwoPhase(model, T, p, z, work))) return true;
  }
  wilsonLnK(model, T, p, work.lnK);
  work.beta = 0.5;
  if (straddles(z, work.lnK) && accepted(solveTwoPhase(model, T, p, z, work))) return true;

  const test = model.stability(T, p, z);
  if (test.stable) return false;
  for (let i = 0; i < z.length; i++) {
    const ratio = z[i]! > 0 ? Math.log(Math.max(test.trialComposition[i]!, 1e-290) / z[i]!) : 0;
    work.lnK[i] = test.trialIsVapour ? ratio : -ratio;
  }
  work.beta = test.trialIsVapour ? 0.1 : 0.9;
  if (accepted(solveTwoPhase(model, T, p, z, work))) return true;
  if (accepted(splitOffTrial(model, T, p, z, test.trialComposition, work))) return true;
  throw new EngineError("no-convergence", "the feed is unstable, but the two phases could not be found", {
    temperatureK: T,
    pressurePa: p,
    tangentPlaneDistance: test.tangentPlaneDistance,
  });
}

/** Is the split below the homogeneous phase in Gibbs energy? */
function lowersGibbs(model: FluidModel, T: number, p: number, z: ArrayLike<number>, work: TwoPhaseWork): boolean {
  const lnPhi = work.gradient; // free between solves
  model.lnFugacityCoefficients(T, p, z, "stable", lnPhi);
  let homogeneous = 0;
  for (let i = 0; i < z.length; i++) if (z[i]! > 0) homogeneous += z[i]! * (Math.log(z[i]!) + lnPhi[i]!);
  return work.gibbs < homogeneous;
}

function straddles(z: ArrayLike<number>, lnK: Float64Array): boolean {
  let bubble = 0;
  let dew = 0;
  for (let i = 0; i < z.length; i++) {
    if (!(z[i]! > 0)) continue;
    bubble += z[i]! * Math.expm1(lnK[i]!);
    dew += z[i]! * Math.expm1(-lnK[i]!);
  }
  return bubble > 0 && dew > 0;
}

function requireState(model: FluidModel, T: number, p: number): void {
  if (!(T > 0 && Number.isFinite(T))) throw new EngineError("invalid-case", "temperature must be above 0 K", {}, "temperatureK");
  if (!(p > 0 && Number.isFinite(p))) throw new EngineError("invalid-case", "pressure must be above 0 Pa", {}, "pressurePa");
  const [low, high] = model.temperatureRangeK;
  if (T < low || T > high) {
    throw new EngineError("outside-validity", `temperature must lie between ${low} and ${high} K for this equation`, {
      temperatureK: T,
    });
  }
}

const works = new Map<number, TwoPhaseWork>();

export function flashWork(count: number): TwoPhaseWork {
  let work = works.get(count);
  if (!work) works.set(count, (work = createTwoPhaseWork(count)));
  return work;
}

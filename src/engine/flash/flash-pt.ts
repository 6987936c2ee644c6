import { EngineError } from "../errors";
import type { FluidModel } from "../eos/fluid-model";
import { assemble } from "./assemble";
import type { Equilibrium } from "./equilibrium";
import { testStability } from "./stability";
import { minimiseGibbs } from "./minimise-gibbs";
import { minimiseThreePhases, startThirdPhase, threePhaseWork } from "./three-phase-pt";
import {
  createTwoPhaseWork,
  solveTwoPhase,
  splitOffComponent,
  splitOffTrial,
  type TwoPhaseOutcome,
  type TwoPhaseWork,
} from "./two-phase-pt";
import { furtherSearches, mostMixed } from "./verify-phases";
import { wilsonLnK } from "./wilson";

/**
 * Equilibrium at given temperature and pressure: one phase, two, or three (vapour, hydrocarbon liquid and water; two liquids and vapour).
 *
 * A two-phase answer is accepted only when its Gibbs energy is below that of the homogeneous phase; one phase is accepted only
 * from a stability test that converged. Where a phase of two would split again, a third is split off. A pure fluid is one phase here at every pressure but its saturation pressure.
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
  if (split.phases > 1) {
    if (split.trial) return withThirdPhase(model, T, p, z, work, split.trial);
    return assembleSplit(model, T, p, work);
  }
  model.residual.setComposition(z);
  const molarVolume = model.residual.volumeAtPressure(T, p, "stable");
  return assemble(model, T, p, [{ moleFraction: 1, composition: z, molarVolume }]);
}

/** How many phases were found, and the trial of a further one where there is one. */
type Split = { phases: 1; trial?: undefined } | { phases: 2; trial?: ArrayLike<number> };

/**
 * Leaves the split of lowest Gibbs energy that was found in `work`. A split is tested like any phase: where one of its own phases
 * would split again, the new phase is tried as a partner of the feed, and what still fails the test is reported with its trial.
 */
function findSplit(model: FluidModel, T: number, p: number, z: ArrayLike<number>, work: TwoPhaseWork, seed?: Equilibrium): Split {
  if (!convergedSplit(model, T, p, z, work, seed)) return { phases: 1 };
  for (let round = 0; ; round++) {
    const trial = furtherPhase(model, T, p, work);
    if (!trial) return { phases: 2 };
    if (round === 3) return { phases: 2, trial };
    const before = work.gibbs;
    const kept = [work.v.slice(), work.l.slice()] as const;
    const better = splitOffTrial(model, T, p, z, trial, work) === "converged" && work.gibbs < before - 1e-12;
    if (!better) {
      work.v.set(kept[0]);
      work.l.set(kept[1]);
      minimiseGibbs(model, T, p, z, work);
      return { phases: 2, trial };
    }
  }
}

/** The trial composition of a phase that would split off the two in `work`. */
function furtherPhase(model: FluidModel, T: number, p: number, { vapour, liquid }: TwoPhaseWork): Float64Array | undefined {
  const tested = mostMixed([liquid.composition, vapour.composition]);
  const partner = tested === liquid.composition ? vapour.composition : liquid.composition;
  const test = testStability(model, T, p, tested, { partner, searches: furtherSearches(model, tested) });
  return test.tangentPlaneDistance > thirdPhaseDistance ? undefined : test.trialComposition;
}

function assembleSplit(model: FluidModel, T: number, p: number, work: TwoPhaseWork): Equilibrium {
  return assemble(model, T, p, [
    { moleFraction: work.beta, composition: work.vapour.composition, molarVolume: work.vapour.molarVolume },
    { moleFraction: 1 - work.beta, composition: work.liquid.composition, molarVolume: work.liquid.molarVolume },
  ]);
}

/** Three phases from the two in `work` and a trial; or another two, where a phase vanishes on the way down. */
function withThirdPhase(
  model: FluidModel,
  T: number,
  p: number,
  z: ArrayLike<number>,
  work: TwoPhaseWork,
  trial: ArrayLike<number>,
): Equilibrium {
  const three = threePhaseWork(z.length);
  startThirdPhase(model, T, p, z, work, trial, three);
  const outcome = minimiseThreePhases(model, T, p, z, three);
  if (outcome === "converged") {
    const found = assemble(
      model,
      T,
      p,
      three.phases.map(({ composition, molarVolume }, k) => ({ moleFraction: three.totals[k]!, composition, molarVolume })),
    );
    const composition = mostMixed(three.phases.map((phase) => phase.composition));
    const test = testStability(model, T, p, composition, { searches: furtherSearches(model, composition) });
    const complete = test.tangentPlaneDistance > thirdPhaseDistance;
    return complete ? found : { ...found, missingPhase: true };
  }
  if (outcome === "vanished" && keepTwo(z, three, work) && minimiseGibbs(model, T, p, z, work) === "converged") {
    const missing = furtherPhase(model, T, p, work) !== undefined;
    const found = assembleSplit(model, T, p, work);
    return missing ? { ...found, missingPhase: true } : found;
  }
  return { ...assembleSplit(model, T, p, work), missingPhase: true };
}

/** The two larger of three phases, with what little the third holds added to the heavier of them. */
function keepTwo(z: ArrayLike<number>, { moles, totals }: ReturnType<typeof threePhaseWork>, { v, l }: TwoPhaseWork): boolean {
  const order = [0, 1, 2].sort((a, b) => totals[b]! - totals[a]!);
  const second = moles[order[1]!]!;
  for (let i = 0; i < z.length; i++) {
    v[i] = Math.min(second[i]!, z[i]!);
    l[i] = z[i]! - v[i]!;
    if (z[i]! > 0 && !(l[i]! > 0)) {
      l[i] = 1e-290;
      v[i] = z[i]!;
    }
  }
  return totals[order[1]!]! > 1e-9;
}

/** A tangent-plane distance this small is the round-off of two phases that have just been found equal. */
const thirdPhaseDistance = -1e-7;
const onTheBoundary = -1e-7;

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
  // Two liquids that hardly mix: nearly all of one component by itself is a start that the K-values never reach.
  for (let alone = z.length - 1; alone >= 0; alone--) {
    if (z[alone]! > 1e-9 && accepted(splitOffComponent(model, T, p, z, alone, work))) return true;
  }
  // On the boundary itself the second phase is too little to be found, and too little to matter.
  if (test.tangentPlaneDistance > onTheBoundary) return false;
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

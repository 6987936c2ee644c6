/**
 * The same fire with a valve that opens late: steel heats up while the pressure is still there.
 *
 * Each delay is a run of its own, with every opening but relief devices shut until then. A run that the engine refuses is named, not dropped.
 */
import type { BlowdownCase } from "../cases/blowdown-case";
import type { LateOpening } from "../cases/blowdown-result";
import { EngineError } from "../errors";
import { steelInFire } from "./steel-in-fire";
import type { FireRun } from "./surroundings";

/** A run of another case, with its curves; coarse will do. */
export type Rerun = (blowdown: BlowdownCase) => Pick<FireRun, "series" | "summary">;

export function lateOpenings(blowdown: BlowdownCase, fluid: FireRun["fluid"], rerun: Rerun): LateOpening[] {
  const { lateByS = [], ...given } = blowdown.steelInFire ?? {};
  return lateByS.map((delayS): LateOpening => {
    try {
      const late = shutUntil({ ...blowdown, steelInFire: given }, delayS);
      const found = steelInFire(late, { fluid, ...rerun(late) });
      const worst = found?.items.find((item) => item.governs);
      if (!found || !worst) return { delayS, refused: "There is no steel whose diameter is known." };
      const { leastRatio, ruptureTimeS } = worst;
      return {
        delayS,
        itemId: worst.id,
        leastRatio,
        verdict: found.verdict,
        ...(ruptureTimeS === undefined ? {} : { ruptureTimeS }),
      };
    } catch (error) {
      if (!(error instanceof EngineError) || error.code === "cancelled") throw error;
      return { delayS, refused: error.message };
    }
  });
}

function shutUntil(blowdown: BlowdownCase, delayS: number): BlowdownCase {
  const later = <One extends BlowdownCase["release"]>(release: One): One =>
    release.path === "relief" ? release : { ...release, opensAtS: (release.opensAtS ?? 0) + delayS };
  return {
    ...blowdown,
    release: later(blowdown.release),
    ...(blowdown.releases ? { releases: blowdown.releases.map(later) } : {}),
    run: { ...blowdown.run, stopTimeS: blowdown.run.stopTimeS + delayS },
  };
}

/** The smallest bore that is fast enough in the fire, with a run at a thousandth less and more beside it. */
import { sizeBore } from "../cases/blowdown/size-bore";
import type { BlowdownCase, SizedRelease } from "../cases/blowdown-case";
import type { SizingEdge } from "../cases/sizing-case";
import { orificeOf } from "./figures-of-bore";
import { underPath, type LookUp } from "./look-up";
import type { SizingLimits } from "./sizing-limits";

const aside = 1e-3;

export function fireEdge(fire: BlowdownCase, limits: SizingLimits, lookUp: LookUp): SizingEdge {
  const { targetPressurePa = 0, targetTimeS = 0 } = limits;
  const given = underPath("fire", () => orificeOf(fire.release, fire.release.path === "orifice" ? fire.release.diameterM : 1));
  const { path: _path, diameterM: _bore, ...rest } = given;
  const release: SizedRelease = { ...rest, path: "sized", targetPressurePa, targetTimeS };
  const found = underPath("fire", () =>
    sizeBore({ ...fire, release }, release, {
      maxEvaluations: 100_000,
      ...(lookUp.isCancelled ? { isCancelled: lookUp.isCancelled } : {}),
    }),
  );
  lookUp.counted.runs += found.runs;
  lookUp.counted.evaluations += found.evaluations;
  const beside = [found.diameterM * (1 - aside), found.diameterM * (1 + aside)].map((diameterM) => {
    const value = lookUp.tightTimeS(diameterM);
    return { diameterM, ...(value === undefined ? {} : { value }) };
  });
  return {
    diameterM: found.diameterM,
    governedBy: "fire-time",
    value: found.timeS,
    limit: targetTimeS,
    unit: "s",
    confirmed: beside,
  };
}

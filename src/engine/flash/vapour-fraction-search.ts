import type { FluidModel } from "../eos/fluid-model";
import { EngineError } from "../errors";
import { bracketedRoot } from "./bracketed-root";
import type { Equilibrium } from "./equilibrium";
import { flashPT } from "./flash-pt";
import { lever, type Sides } from "./lever";

/** How near to nothing the vapour (or the liquid) is taken where a search cannot ask for exactly nothing. */
const leastShare = 1e-7;

/**
 * The saturated state of a fluid that also holds free water or a second liquid: a search over PT flashes, which know every phase, for the
 * vapour fraction. Bubble and dew points are approached to a share of 1e-7.
 */
export function withEveryPhase(
  model: FluidModel,
  z: ArrayLike<number>,
  Q: number,
  given: { lnT: number; lnP?: undefined } | { lnP: number; lnT?: undefined },
  near: Equilibrium | undefined,
): Equilibrium {
  const wanted = Math.min(Math.max(Q, leastShare), 1 - leastShare);
  const byTemperature = given.lnT !== undefined;
  let latest: Equilibrium | undefined;
  const sides: Sides = {};
  const excess = (x: number): number => {
    const [lnT, lnP] = byTemperature ? [given.lnT, -x] : [x, given.lnP];
    latest = flashPT(model, { temperatureK: Math.exp(lnT), pressurePa: Math.exp(lnP) }, z, latest);
    const difference = latest.vapourMoleFraction - wanted;
    if (difference < 0) sides.below = latest;
    else sides.above = latest;
    return difference;
  };
  // Vapour grows as the pressure falls (x = −ln p) or the temperature rises (x = ln T).
  let a = byTemperature ? -Math.log(near?.pressurePa ?? 1e6) : Math.log(near?.temperatureK ?? 350);
  let fa = excess(a);
  let b = a;
  let fb = fa;
  const [jump, most] = byTemperature ? [0.3, 60] : [0.04, 60];
  for (let k = 0; k < most && fa * fb > 0; k++) {
    a = b;
    fa = fb;
    b += fb > 0 ? -jump : jump;
    fb = excess(b);
  }
  const x = bracketedRoot(excess, { a, fa, b, fb }, { within: 1e-14, what: "state of given vapour fraction" });
  if (Math.abs(excess(x)) <= 1e-9) return latest!;
  const { below, above } = sides;
  const share = below && above ? (wanted - below.vapourMoleFraction) / (above.vapourMoleFraction - below.vapourMoleFraction) : -1;
  const merged = below && above ? lever(model, below, above, share) : undefined;
  if (merged) return merged;
  throw new EngineError("no-convergence", "no state with every phase has this vapour fraction", { vapourMoleFraction: Q });
}

/**
 * The window of bores: large enough to reach the target pressure in time in a fire, small enough to keep the steel warm enough in the cold case.
 *
 *   smallest   time to the target falls as the bore grows: secant inside a bracket (`cases/blowdown/size-bore.ts`)
 *   largest    the coldest steel along a row of bores, then a bracketed root where it crosses its limit
 *
 * The steel need not get colder with every larger bore: a slow blowdown can draw more heat from it. So the row is looked through for stretches of
 * bores that are warm enough, and where smaller bores are too cold again, that edge is found too. Rows are run at a loose tolerance, edges at the case's own.
 * Throws   EngineError with the path in the case that caused it
 * Checks   run-sizing.test.ts
 */
import type { SizingCase, SizingResult } from "../cases/sizing-case";
import { fireCaution, oneTemperatureCaution, screeningCaution, steelCaution, type Caution } from "../cautions";
import { EngineError } from "../errors";
import { coldEdges } from "./cold-edges";
import { fireEdge } from "./fire-edge";
import { makeLookUp, rowOfBores } from "./look-up";
import { limitsOf } from "./sizing-limits";
import { loadPassedAbove, windowOf, windowSentence } from "./window";

export type SizingOptions = { onProgress?: (part: number) => void; isCancelled?: () => boolean };
export type SizingBody = Omit<SizingResult, "engineVersion" | "caseSha256" | "numerics"> & {
  numerics: Omit<SizingResult["numerics"], "wallClockMs">;
};

export function runSizing(sizing: SizingCase, options: SizingOptions = {}): SizingBody {
  const { fire, cold, chosenDiameterM } = sizing;
  if (!fire && !cold)
    throw new EngineError("invalid-case", "There is nothing to size for. Give a fire case, a cold case, or both.", {}, "fire");
  const limits = limitsOf(sizing);
  const counted = { runs: 0, evaluations: 0 };
  const lookUp = makeLookUp(sizing, limits, { isCancelled: options.isCancelled, counted });

  const smallest = fire && fireEdge(fire, limits, lookUp);
  options.onProgress?.(0.3);
  const curve = rowOfBores(sizing, smallest?.diameterM, lookUp);
  options.onProgress?.(0.7);
  const { largest, coldBelow } = cold ? coldEdges(curve, limits, smallest?.diameterM, lookUp) : {};
  options.onProgress?.(0.95);
  const window = windowOf({ smallest, largest, coldBelow, curve, limits });
  const bore = chosenDiameterM ?? boreOf(cold) ?? boreOf(fire);
  const chosen = bore === undefined ? undefined : lookUp.tight(bore);
  const passed = loadPassedAbove(curve, limits.ventCapacityKgPerS);
  const cautions = cautionsOf(sizing);
  return {
    format: "ebbmark-result/1",
    kind: "sizing",
    ...(smallest ? { smallest } : {}),
    ...(largest ? { largest } : {}),
    ...(coldBelow ? { coldBelow } : {}),
    window,
    sentence: windowSentence(window, { smallest, largest, coldBelow, bothAsked: fire !== undefined && cold !== undefined }),
    ...(chosen
      ? {
          chosen: {
            ...chosen,
            inWindow:
              window.state !== "none" && chosen.diameterM >= (window.fromM ?? 0) && chosen.diameterM <= (window.toM ?? Infinity),
            ...(chosen.timeToTargetS !== undefined && limits.targetTimeS !== undefined
              ? { timeInHandS: limits.targetTimeS - chosen.timeToTargetS }
              : {}),
            ...(chosen.minimumWallTemperatureK !== undefined && limits.minimumWallTemperatureK !== undefined
              ? { steelInHandK: chosen.minimumWallTemperatureK - limits.minimumWallTemperatureK }
              : {}),
          },
        }
      : {}),
    curve,
    limits,
    ...(passed === undefined ? {} : { loadPassedAboveM: passed }),
    warnings: lookUp.failed,
    cautions: cautions.map(({ words }) => words),
    cautionIds: cautions.map(({ id }) => id),
    numerics: { runs: counted.runs, evaluations: counted.evaluations },
  };
}

const boreOf = (blowdown: SizingCase["fire"]): number | undefined =>
  blowdown?.release.path === "orifice" ? blowdown.release.diameterM : undefined;

function cautionsOf({ fire, cold }: SizingCase): Caution[] {
  return [
    screeningCaution,
    oneTemperatureCaution((cold ?? fire)?.heat.wall.model ?? "none"),
    ...(fire ? [fireCaution] : []),
    ...(cold ? [steelCaution] : []),
  ];
}

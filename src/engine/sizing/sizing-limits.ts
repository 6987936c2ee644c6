/** What the two cases of a sizing are held against, each from its own limits. */
import type { SizingCase, SizingResult } from "../cases/sizing-case";
import { EngineError } from "../errors";

export type SizingLimits = SizingResult["limits"];

export function limitsOf({ fire, cold }: SizingCase): SizingLimits {
  const target = fire && targetOf(fire);
  if (fire && !target)
    throw new EngineError(
      "invalid-case",
      "The fire case has no target. Give targetPressurePa and targetTimeS in its limits.",
      {},
      "fire.limits",
    );
  const rated = cold?.vessel.wall?.minimumDesignMetalTemperatureK;
  if (cold && cold.heat.wall.model === "none")
    throw new EngineError(
      "invalid-case",
      'The cold case has no wall to keep warm. Set its heat.wall to "lumped" or "conduction".',
      {},
      "cold.heat.wall",
    );
  if (cold && rated === undefined)
    throw new EngineError(
      "invalid-case",
      "The cold case has no rated temperature. Give vessel.wall.minimumDesignMetalTemperatureK.",
      {},
      "cold.vessel.wall.minimumDesignMetalTemperatureK",
    );
  const capacity = fire?.limits?.ventCapacityKgPerS ?? cold?.limits?.ventCapacityKgPerS;
  return {
    ...target,
    ...(rated === undefined ? {} : { minimumWallTemperatureK: rated + (cold?.limits?.minimumMetalMarginK ?? 0) }),
    ...(capacity === undefined ? {} : { ventCapacityKgPerS: capacity }),
  };
}

function targetOf({
  release,
  limits = {},
}: NonNullable<SizingCase["fire"]>): { targetPressurePa: number; targetTimeS: number } | undefined {
  if (release.path === "sized") return { targetPressurePa: release.targetPressurePa, targetTimeS: release.targetTimeS };
  const { targetPressurePa, targetTimeS } = limits;
  return targetPressurePa === undefined || targetTimeS === undefined ? undefined : { targetPressurePa, targetTimeS };
}

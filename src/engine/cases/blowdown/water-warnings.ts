import { EngineError } from "../../errors";
import { flashUV } from "../../flash/flash-uv";
import { phaseWarnings } from "../../flash/phase-warnings";
import { mayHoldWater } from "../../flash/third-phase";
import type { BlowdownCase } from "../blowdown-case";
import type { Warning } from "../warning";
import type { VesselModel } from "./vessel-model";

/** What has to be said of the phases at the start where the fluid holds water, and of water that a liquid outlet would drain first. */
export function waterWarnings({ release }: BlowdownCase, { fluid, start, vessel }: VesselModel): Warning[] {
  if (!mayHoldWater(fluid, fluid.feed)) return [];
  const state = flashUV(fluid, {
    internalEnergyJPerMol: start.internalEnergyJ / start.totalMolesMol,
    molarVolumeM3PerMol: vessel.volumeM3 / start.totalMolesMol,
  });
  const found = attempted(() => phaseWarnings(fluid, state)).map(({ code, message }) => ({
    code,
    message: `At the start: ${message}`,
  }));
  if (release.from !== "liquid" || state.phases.length < 3) return found;
  return [
    ...found,
    {
      code: "water-at-the-bottom",
      message:
        "Water settles below the hydrocarbon liquid and would leave first through a liquid outlet. The run lets the lighter liquid out and keeps the water.",
    },
  ];
}

/** A phase test that fails is a warning of its own, not the end of a run that is already there. */
function attempted(work: () => Warning[]): Warning[] {
  try {
    return work();
  } catch (error) {
    if (!(error instanceof EngineError)) throw error;
    return [{ code: "phases-not-verified", message: `the test for a further phase did not close (${error.message})` }];
  }
}

import type { Warning } from "../cases/warning";
import type { FluidModel } from "../eos/fluid-model";
import type { Equilibrium } from "./equilibrium";
import { verifyPhases } from "./verify-phases";

/** What has to be said about the phases of an equilibrium: a phase that the answer leaves out. */
export function phaseWarnings(model: FluidModel, state: Equilibrium): Warning[] {
  const verdict = state.thirdPhase ? "third-phase" : verifyPhases(model, state);
  if (verdict === "sound") return [];
  const water = model.componentIds.indexOf("water");
  const wet = water >= 0 && model.feed[water]! > 0;
  const where = `at ${state.temperatureK.toFixed(2)} K and ${(state.pressurePa / 1e5).toFixed(3)} bar`;
  const missing = verdict === "third-phase" ? "A third phase" : "A second phase";
  return [
    {
      code: wet ? "free-water" : verdict,
      message: `${missing}${wet ? " (with water in the feed: probably free water)" : ""} would form ${where} and is left out of this result.`,
    },
  ];
}

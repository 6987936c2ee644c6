/** Kind "nozzle": the stagnation state, then the flux of an ideal nozzle to the back pressure. */
import { equationCaution, screeningCaution } from "../../cautions";
import { createFluidModel } from "../../eos/create-fluid-model";
import { EngineError } from "../../errors";
import { flashPQ } from "../../flash/flash-quality";
import { flashPT } from "../../flash/flash-pt";
import type { Equilibrium } from "../../flash/equilibrium";
import { equilibriumNozzle } from "../../flow/equilibrium-nozzle";
import { frozenNozzle } from "../../flow/frozen-nozzle";
import type { NozzleCase, NozzleResult } from "../nozzle-case";

export function runNozzle({ fluid: given, stagnation, backPressurePa, flowModel }: NozzleCase): NozzleResult {
  const fluid = createFluidModel(given);
  const state: Equilibrium = "temperatureK" in stagnation ? flashPT(fluid, stagnation) : flashPQ(fluid, stagnation);
  const flow =
    flowModel === "equilibrium"
      ? equilibriumNozzle(fluid, state, fluid.feed, backPressurePa)
      : frozenNozzle(fluid, onlyPhase(state), fluid.feed, backPressurePa);
  const warnings = fluid.notes.map((message) => ({ code: "fluid-data", message }));
  return {
    format: "ebbmark-result/1",
    kind: "nozzle",
    ...flow,
    warnings,
    cautions: [screeningCaution.words, equationCaution.words],
  };
}

/** The one phase there is; a saturated state of all vapour or all liquid counts as one. */
function onlyPhase({ phases }: Equilibrium): Equilibrium["phases"][number]["state"] {
  const filled = phases.filter((phase) => phase.moleFraction > 1e-12);
  const [one] = filled;
  if (filled.length !== 1 || !one) {
    throw new EngineError(
      "two-phase-start",
      'The stagnation state is part vapour and part liquid, which frozen flow does not hold for. Use "equilibrium".',
      {},
      "flowModel",
    );
  }
  return one.state;
}

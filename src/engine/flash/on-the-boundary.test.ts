/** On a bubble or dew line the second phase is too little to find: the answer is one phase or nearly nothing of a second, never a refusal. */
import { describe, expect, it } from "vitest";
import { createFluidModel } from "../eos/create-fluid-model";
import { flashPT } from "./flash-pt";
import { flashTQ } from "./flash-quality";

const fluids: Record<string, number>[] = [
  { ethane: 0.3, propane: 0.4, n_butane: 0.2, n_pentane: 0.1 },
  { methane: 0.85, ethane: 0.06, propane: 0.04, n_butane: 0.025, n_heptane: 0.025 },
  { carbon_dioxide: 0.95, hydrogen: 0.03, nitrogen: 0.02 },
];

describe("a PT flash on the boundary", () => {
  for (const fluid of fluids) {
    it.each([0, 1])(`${Object.keys(fluid).join(", ")}, vapour fraction %d`, (vapourMoleFraction) => {
      const model = createFluidModel({
        components: Object.entries(fluid).map(([id, moleFraction]) => ({ id, moleFraction })),
        equation: "peng-robinson-1976",
        interaction: "library",
      });
      const temperatureK = 0.75 * model.criticalTemperaturesK.reduce((sum, Tc, i) => sum + Tc * model.feed[i]!, 0);
      const boundary = flashTQ(model, { temperatureK, vapourMoleFraction });
      for (let power = 4; power <= 14; power += 0.5) {
        for (const side of [-1, 1]) {
          const pressurePa = boundary.pressurePa * (1 + side * 10 ** -power);
          const { vapourMoleFraction: found } = flashPT(model, { temperatureK, pressurePa });
          expect(Math.abs(found - vapourMoleFraction)).toBeLessThan(0.02);
        }
      }
    });
  }
});

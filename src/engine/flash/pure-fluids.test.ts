import { describe, expect, it } from "vitest";
import type { EquationId } from "../cases/fluid-spec";
import { createFluidModel } from "../eos/create-fluid-model";
import { gergComponents } from "../eos/gerg/gerg-data";
import { referenceFluids } from "../eos/reference/reference-data";
import { flashTQ } from "./flash-quality";
import { flashUV } from "./flash-uv";
import { saturationAtPressure, saturationAtTemperature } from "./saturation-pure";

const ids: Partial<Record<EquationId, string[]>> = {
  "gerg-2008": [...gergComponents.keys()],
  reference: [...referenceFluids.keys()],
  "peng-robinson-1976": [...gergComponents.keys()],
  "soave-redlich-kwong": [...gergComponents.keys()],
  "van-der-waals": ["methane", "carbon_dioxide", "n_decane", "water"],
};

describe("a boiling pure fluid", () => {
  for (const [equation, fluids] of Object.entries(ids) as [EquationId, string[]][]) {
    it(`by ${equation} is found again from its pressure, and from its energy and volume, for ${fluids.length} fluids`, () => {
      for (const id of fluids) {
        const model = createFluidModel({ equation, components: [{ id, moleFraction: 1 }] });
        for (const reduced of [0.45, 0.55, 0.7, 0.85, 0.95, 0.99]) {
          const temperatureK = reduced * model.criticalTemperaturesK[0]!;
          if (temperatureK < model.temperatureRangeK[0]) continue;
          const saturation = saturationAtTemperature(model, temperatureK, [1]);
          const back = saturationAtPressure(model, saturation.pressurePa, [1]);
          expect(Math.abs(back.temperatureK / temperatureK - 1), `${id} at ${reduced} Tc`).toBeLessThan(1e-9);
          const mix = flashTQ(model, { temperatureK, vapourMoleFraction: 0.3 });
          const again = flashUV(model, mix, [1]);
          expect(Math.abs(again.temperatureK / temperatureK - 1), `${id} at ${reduced} Tc`).toBeLessThan(1e-8);
          expect(Math.abs(again.vapourMoleFraction - 0.3), `${id} at ${reduced} Tc`).toBeLessThan(1e-6);
        }
      }
    });
  }
});

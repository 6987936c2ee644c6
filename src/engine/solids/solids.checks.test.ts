import { describe, expect, it } from "vitest";
import { relativeError } from "../../../tests/fixtures/check-file";
import { methodCheck } from "../../../tests/fixtures/method-check";
import { createFluidModel } from "../eos/create-fluid-model";
import { flashPT } from "../flash/flash-pt";
import { hammerschmidtDepression, motieeHydrateTemperature, towlerMokhatabHydrateTemperature } from "./hydrate";
import {
  carbonDioxideSublimationPressure,
  carbonDioxideTriple,
  iceSublimationPressure,
  waterSaturationPressure,
} from "./solid-lines";
import { solidWarnings } from "./solid-warnings";

interface Value {
  value: number;
}

describe("solid lines and hydrate temperatures, tests/fixtures/checks/methods.json M5-01 to M5-04", () => {
  it(`M5-01 (${methodCheck("M5-01").source})`, () => {
    const { inputs, expected, tolerance } = methodCheck("M5-01");
    (inputs.T as Value[]).forEach(({ value }, i) => {
      const pressure = (expected.p as Value[])[i]!.value;
      expect(relativeError(carbonDioxideSublimationPressure(value), pressure)).toBeLessThan(tolerance.relative!);
    });
  });

  it(`M5-02 (${methodCheck("M5-02").source})`, () => {
    const { inputs, expected, tolerance } = methodCheck("M5-02");
    const water = waterSaturationPressure((inputs.T_water as Value).value);
    const ice = iceSublimationPressure((inputs.T_ice as Value).value);
    expect(relativeError(water, (expected.p_water as Value).value)).toBeLessThan(tolerance.relative!);
    expect(relativeError(ice, (expected.p_ice as Value).value)).toBeLessThan(tolerance.relative!);
  });

  it(`M5-03 (${methodCheck("M5-03").source})`, () => {
    const { inputs, expected, tolerance } = methodCheck("M5-03");
    const p = (inputs.p as Value).value * 6894.757293168361;
    const fahrenheit = (K: number) => K * 1.8 - 459.67;
    const gravity = inputs.gas_gravity as number;
    expect(Math.abs(fahrenheit(motieeHydrateTemperature(p, gravity)) - (expected.T_Motiee as Value).value)).toBeLessThan(
      tolerance.absolute!,
    );
    expect(
      Math.abs(fahrenheit(towlerMokhatabHydrateTemperature(p, gravity)) - (expected.T_Towler_Mokhatab as Value).value),
    ).toBeLessThan(tolerance.absolute!);
  });

  it(`M5-04 (${methodCheck("M5-04").source})`, () => {
    const { inputs, expected, tolerance } = methodCheck("M5-04");
    const depression = hammerschmidtDepression(inputs.w as number, inputs.M_inhibitor as number, inputs.K_H as number);
    expect(relativeError(depression, (expected.dT as Value).value)).toBeLessThan(tolerance.relative!);
  });

  it("meet at the triple points and refuse temperatures outside", () => {
    expect(carbonDioxideSublimationPressure(carbonDioxideTriple.temperatureK)).toBeCloseTo(carbonDioxideTriple.pressurePa, 6);
    expect(relativeError(iceSublimationPressure(273.16), waterSaturationPressure(273.16))).toBeLessThan(1e-4);
    expect(() => carbonDioxideSublimationPressure(230)).toThrow(expect.objectContaining({ code: "outside-validity" }));
    expect(() => waterSaturationPressure(Number.NaN)).toThrow(expect.objectContaining({ code: "outside-validity" }));
    expect(() => motieeHydrateTemperature(7e6, 1.4)).toThrow(expect.objectContaining({ code: "outside-validity" }));
  });
});

describe("warnings of solids", () => {
  const codes = (composition: Record<string, number>, temperatureK: number, pressurePa: number) => {
    const components = Object.entries(composition).map(([id, moleFraction]) => ({ id, moleFraction }));
    const model = createFluidModel({ equation: "peng-robinson-1976", components });
    return solidWarnings(model, flashPT(model, { temperatureK, pressurePa })).map(({ code }) => code);
  };

  it("find solid carbon dioxide on the cold side of the sublimation line and not on the warm side", () => {
    expect(codes({ carbon_dioxide: 1 }, 194, 101325)).toContain("solid-carbon-dioxide");
    expect(codes({ carbon_dioxide: 1 }, 195.3, 101325)).not.toContain("solid-carbon-dioxide");
    expect(codes({ methane: 0.98, carbon_dioxide: 0.02 }, 200, 3e6)).not.toContain("solid-carbon-dioxide");
    expect(codes({ methane: 0.8, carbon_dioxide: 0.2 }, 175, 2e6)).toContain("solid-carbon-dioxide");
  });

  it("speak of ice and hydrate only where water is", () => {
    expect(codes({ methane: 0.999, water: 0.001 }, 268, 7e6)).toEqual(expect.arrayContaining(["ice", "hydrate"]));
    expect(codes({ methane: 0.999, water: 0.001 }, 320, 7e6)).toEqual([]);
    expect(codes({ methane: 1 }, 268, 7e6)).toEqual([]);
  });

  it("notice a main component below its triple point", () => {
    expect(codes({ nitrogen: 1 }, 60, 1e5)).toContain("below-triple-point");
  });
});

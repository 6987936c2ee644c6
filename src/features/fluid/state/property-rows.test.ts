import { describe, expect, it } from "vitest";
import { createFluidModel } from "@/engine/eos/create-fluid-model";
import { stateProperties } from "@/engine/properties/state-properties";
import { phaseNames, stateWords } from "./phase-words";
import { propertyRows } from "./property-rows";

const model = createFluidModel({
  components: [
    { id: "methane", moleFraction: 0.7 },
    { id: "n_butane", moleFraction: 0.3 },
  ],
  equation: "peng-robinson-1976",
});
const two = stateProperties(model, { temperatureK: 290, pressurePa: 30e5 });
const row = (basis: "mole" | "mass", name: string) => propertyRows(two, basis).find((one) => one.name === name);

describe("the property table", () => {
  it("has the whole for sums alone, and each phase for all", () => {
    expect(two.phases).toHaveLength(2);
    expect(row("mole", "Enthalpy")?.overall).toBe(two.overall.enthalpyJPerMol);
    expect(row("mole", "Speed of sound")?.overall).toBeUndefined();
    expect(row("mole", "Surface tension")?.phases[0]).toBeUndefined();
    expect(row("mole", "Surface tension")?.phases[1]).toBeGreaterThan(0);
  });

  it("takes each phase's own molar mass for values per mass", () => {
    const enthalpy = row("mass", "Enthalpy");
    expect(enthalpy?.quantity).toBe("specificEnergy");
    two.phases.forEach(({ enthalpyJPerMol, molarMassKgPerMol }, i) =>
      expect(enthalpy?.phases[i]).toBeCloseTo(enthalpyJPerMol / molarMassKgPerMol, 8),
    );
    expect(row("mass", "Density")).toEqual(row("mole", "Density"));
  });

  it("leaves out what no phase has", () => {
    const gas = stateProperties(model, { temperatureK: 420, pressurePa: 1e5 });
    expect(propertyRows(gas, "mole").map(({ name }) => name)).not.toContain("Surface tension");
  });
});

describe("the words for a state", () => {
  const vapour = { kind: "vapour" as const, aqueous: false };
  const liquid = { kind: "liquid" as const, aqueous: false };
  const water = { kind: "liquid" as const, aqueous: true };

  it("name each phase, water and a second liquid too", () => {
    expect(phaseNames([vapour, liquid, water])).toEqual(["Vapour", "Liquid", "Water"]);
    expect(phaseNames([liquid, liquid])).toEqual(["Liquid", "Second liquid"]);
  });

  it("never say that a trace is nothing", () => {
    expect(stateWords({ phase: "vapour", vapourMoleFraction: 1 })).toBe("Vapour");
    expect(stateWords({ phase: "two-phase", vapourMoleFraction: 0.934 })).toBe("Vapour and liquid, 93.4\u00a0% vapour by mole");
    expect(stateWords({ phase: "two-phase", vapourMoleFraction: 0.99999, phases: [vapour, liquid, water] })).toBe(
      "Vapour, liquid and water, above 99.9\u00a0% vapour by mole",
    );
    expect(stateWords({ phase: "two-phase", vapourMoleFraction: 0, phases: [liquid, water] })).toBe("Liquid and water");
  });
});

import { describe, expect, it } from "vitest";
import type { ComponentSpec, FluidSpec } from "../cases/fluid-spec";
import { EngineError } from "../errors";
import { createFluidModel } from "./create-fluid-model";

const fluid = (components: ComponentSpec[], rest: Partial<FluidSpec> = {}): FluidSpec => ({
  equation: "peng-robinson-1976",
  components,
  ...rest,
});
const half = (id: string): ComponentSpec => ({ id, moleFraction: 0.5 });

function refusal(spec: FluidSpec): EngineError {
  try {
    createFluidModel(spec);
  } catch (error) {
    if (error instanceof EngineError) return error;
    throw error;
  }
  throw new Error("nothing was refused");
}

describe("a fluid document", () => {
  it.each([
    ["an unknown component", fluid([{ id: "unobtainium", moleFraction: 1 }]), "fluid.components[0].id"],
    ["fractions that do not add up", fluid([half("methane"), { id: "ethane", moleFraction: 0.4 }]), "fluid.components"],
    [
      "a negative fraction",
      fluid([
        { id: "methane", moleFraction: 1.1 },
        { id: "ethane", moleFraction: -0.1 },
      ]),
      "fluid.components[0].moleFraction",
    ],
    ["a component listed twice", fluid([half("methane"), half("methane")]), "fluid.components[1].id"],
    [
      "an unknown pair",
      fluid([half("methane"), half("ethane")], { interaction: [{ pair: ["methane", "propane"], kij: 0 }] }),
      "fluid.interaction[0].pair",
    ],
    [
      "a wild kij",
      fluid([half("methane"), half("ethane")], { interaction: [{ pair: ["methane", "ethane"], kij: 3 }] }),
      "fluid.interaction[0].kij",
    ],
    ["no component", fluid([]), "fluid.components"],
    [
      "a pseudo-component out of range",
      fluid([{ id: "heavy", moleFraction: 1, pseudo: { molarMassKgPerMol: 0.9, relativeDensity: 0.8 } }]),
      "fluid.components[0].pseudo",
    ],
  ])("with %s is refused at the field", (_, spec, path) => {
    expect(refusal(spec).path).toBe(path);
  });

  it("divides fractions by a sum that is 1 within 1e-6", () => {
    const model = createFluidModel(fluid([half("methane"), { id: "ethane", moleFraction: 0.5 + 5e-7 }]));
    expect(model.feed[0]! + model.feed[1]!).toBeCloseTo(1, 15);
  });

  it("uses the published interaction parameters, none, or those listed", () => {
    const pair = [half("nitrogen"), half("methane")];
    const energy = (interaction: FluidSpec["interaction"]) =>
      createFluidModel(fluid(pair, { interaction })).phaseAtPressure(250, 5e6, [0.5, 0.5]).enthalpyJPerMol;
    expect(energy("library")).not.toBe(energy("none"));
    expect(energy([{ pair: ["methane", "nitrogen"], kij: 0 }])).toBeCloseTo(energy("none"), 9);
    expect(energy(undefined)).toBe(energy("library"));
  });

  it("says that a pseudo-component is estimated", () => {
    const heavy = { id: "heavy", moleFraction: 0.5, pseudo: { molarMassKgPerMol: 0.15, relativeDensity: 0.78 } };
    expect(createFluidModel(fluid([half("methane"), heavy])).notes.join(" ")).toMatch(/Riazi/);
  });
});

import fc from "fast-check";
import { describe, expect, it } from "vitest";
import blowdowns from "../../../tests/fixtures/checks/blowdown.json";
import methods from "../../../tests/fixtures/checks/methods.json";
import { createFluidModel } from "../eos/create-fluid-model";
import { fixtureFluid, idealGas } from "../../../tests/fixtures/fluids";
import { frozenNozzle } from "./frozen-nozzle";

const relative = (value: number, expected: number) => Math.abs(value / expected - 1);

describe("frozenNozzle", () => {
  it.each([1.1, 1.2, 1.3, 1.4, 5 / 3])("gives the closed form of an ideal gas with κ = %d, choked and not", (k) => {
    // NACA Report 1135 (1953): G = p0 √(κ M/(R T0)) (2/(κ+1))^((κ+1)/(2(κ−1))), and the subcritical form by the pressure ratio.
    const model = createFluidModel(idealGas(k, 0.0280134));
    const [p0, T0] = [1e6, 300];
    const stagnation = model.phaseAtPressure(T0, p0, model.feed);
    const rt = 8.31446261815324 * T0;
    const choked = frozenNozzle(model, stagnation, model.feed, 1e5);
    expect(
      relative(choked.massFluxKgPerM2S, p0 * Math.sqrt((k * 0.0280134) / rt) * (2 / (k + 1)) ** ((k + 1) / (2 * (k - 1)))),
    ).toBeLessThan(1e-8);
    expect(relative(choked.throatPressurePa / p0, (2 / (k + 1)) ** (k / (k - 1)))).toBeLessThan(1e-8);
    expect(choked.choked).toBe(true);
    const r = 0.8;
    const slow = frozenNozzle(model, stagnation, model.feed, r * p0);
    expect(
      relative(
        slow.massFluxKgPerM2S,
        p0 * Math.sqrt(((2 * 0.0280134) / rt) * (k / (k - 1)) * (r ** (2 / k) - r ** ((k + 1) / k))),
      ),
    ).toBeLessThan(1e-8);
    expect(slow).toMatchObject({ choked: false });
    expect(relative(slow.throatPressurePa, r * p0)).toBeLessThan(1e-9);
  });

  it("agrees with the dossier's Peng-Robinson nitrogen: 150 bar, 290 K (M3-11, own Python calculation)", () => {
    const check = methods.checks.find((row) => row.id === "M3-11");
    const model = createFluidModel({
      equation: "peng-robinson-1976",
      interaction: "none",
      components: [
        {
          id: "n2",
          moleFraction: 1,
          custom: {
            molarMassKgPerMol: 0.0280135,
            criticalTemperatureK: 126.192,
            criticalPressurePa: 3395800,
            acentricFactor: 0.0372,
            idealGasHeatCapacityOverR: {
              polynomial: [3.4486, 0.85671e-3, -4.8311e-6, 11.161e-9, -9.4839e-12, 2.7745e-15],
              rangeK: [110, 900],
            },
          },
        },
      ],
    });
    expect(check).toBeDefined();
    const flow = frozenNozzle(model, model.phaseAtPressure(290, 1.5e7, model.feed), model.feed, 101325);
    expect(relative(flow.massFluxKgPerM2S, 37100.7)).toBeLessThan(2e-4);
    expect(relative(flow.throatPressurePa / 1.5e7, 0.49923)).toBeLessThan(2e-4);
    expect(Math.abs(flow.throatTemperatureK - 236.643)).toBeLessThan(0.05);
  });

  // Series of blowdown.json by Peng-Robinson: flux and throat along whole runs (own Python, checked against a second library).
  const rows = blowdowns.rows.filter((row) => row.definition.eos === "PR" && row.definition.nozzle === "frozen");
  it.each(rows.map((row) => [row.definition.id, row] as const))("gives the flux and the throat along %s", (_id, row) => {
    const model = createFluidModel(fixtureFluid(row.definition.components ?? [], row.definition.z ?? [], blowdowns.components));
    let compared = 0;
    for (const point of row.series) {
      // After a spell of two phases the gas no longer has the composition of the start.
      if (point.two_phase) break;
      const flow = frozenNozzle(model, model.phaseAtPressure(point.T, point.P, model.feed), model.feed, 101325);
      expect(relative(flow.massFluxKgPerM2S, point.G)).toBeLessThan(1e-6);
      expect(relative(flow.throatPressurePa, point.throat_P)).toBeLessThan(1e-5);
      expect(relative(flow.throatTemperatureK, point.throat_T)).toBeLessThan(1e-5);
      expect(flow.choked).toBe(point.choked);
      compared++;
    }
    if (row.definition.id === "S1-B16" || row.definition.id === "S1-B12") expect(compared).toBeGreaterThan(5);
  });

  it("is the largest flux along the isentrope, and never more for a higher back pressure", () => {
    const model = createFluidModel({
      equation: "peng-robinson-1976",
      components: [
        { id: "methane", moleFraction: 0.9 },
        { id: "ethane", moleFraction: 0.1 },
      ],
    });
    fc.assert(
      fc.property(fc.double({ min: 3e5, max: 2e7, noNaN: true }), fc.double({ min: 270, max: 450, noNaN: true }), (p0, T0) => {
        const at = { ...model.phaseAtPressure(T0, p0, model.feed) };
        const flow = frozenNozzle(model, at, model.feed, 101325);
        for (const part of [0.5, 0.9, 0.999, 1.001, 1.1, 1.5]) {
          const v = at.molarVolumeM3PerMol * Math.exp(part * 0.45);
          const state = model.phaseFromEntropyVolume(at.entropyJPerMolK, v, model.feed, T0);
          if (state.pressurePa < 101325) continue;
          const flux =
            state.densityKgPerM3 *
            Math.sqrt((2 * Math.max(at.enthalpyJPerMol - state.enthalpyJPerMol, 0)) / model.mixtureMolarMass(model.feed));
          expect(flux).toBeLessThanOrEqual(flow.massFluxKgPerM2S * (1 + 1e-9));
        }
        let last = Number.POSITIVE_INFINITY;
        for (const part of [0.1, 0.4, 0.5, 0.6, 0.8, 0.95, 0.9999, 1]) {
          const flux = frozenNozzle(model, at, model.feed, part * p0).massFluxKgPerM2S;
          expect(flux).toBeLessThanOrEqual(last * (1 + 1e-9));
          last = flux;
        }
        expect(last).toBe(0);
      }),
      { numRuns: 60 },
    );
  });

  it("lets a liquid flow at the back pressure, as one that does not boil in the throat", () => {
    const model = createFluidModel({ equation: "peng-robinson-1976", components: [{ id: "propane", moleFraction: 1 }] });
    const liquid = { ...model.phaseAtPressure(290, 2e6, model.feed, "liquid") };
    const flow = frozenNozzle(model, liquid, model.feed, 1e6);
    expect(flow.choked).toBe(false);
    expect(relative(flow.massFluxKgPerM2S, Math.sqrt(2 * liquid.densityKgPerM3 * 1e6))).toBeLessThan(0.01);
  });
});

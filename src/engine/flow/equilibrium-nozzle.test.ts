import fc from "fast-check";
import { describe, expect, it } from "vitest";
import isentropic from "../../../tests/fixtures/checks/isentropic.json";
import { fixtureFluid } from "../../../tests/fixtures/fluids";
import { createFluidModel } from "../eos/create-fluid-model";
import { flashPQ, flashTQ } from "../flash/flash-quality";
import { flashPS } from "../flash/flash-ph";
import { flashPT } from "../flash/flash-pt";
import { createEquilibriumHints, equilibriumNozzle } from "./equilibrium-nozzle";
import { frozenNozzle } from "./frozen-nozzle";
import { smallestBetween } from "./smallest-between";

const relative = (value: number, expected: number) => Math.abs(value / expected - 1);

describe("equilibriumNozzle", () => {
  // isentropic.json: maxima along the isentrope by own Python equation of state, G to about 1e-10 (1e-8 on a kink).
  const rows = isentropic.rows.filter((row) => row.model === "PR");
  it.each(rows.map((row) => [row.id, row] as const))("agrees with the reference maximum of %s", (_id, row) => {
    const model = createFluidModel(fixtureFluid(row.components ?? [], row.z ?? [], isentropic.components));
    const stagnation = flashPT(model, { temperatureK: row.initial.T, pressurePa: row.initial.P });
    const flow = equilibriumNozzle(model, stagnation, model.feed, 101325);
    expect(relative(flow.massFluxKgPerM2S, row.nozzle_equilibrium.G)).toBeLessThan(1e-6);
    expect(relative(flow.throatPressurePa, row.nozzle_equilibrium.P_throat)).toBeLessThan(1e-4);
    expect(Math.abs(flow.throatTemperatureK - row.nozzle_equilibrium.T_throat)).toBeLessThan(0.01);
    expect(flow.choked).toBe(true);
  });
  it("covers four such rows", () => expect(rows).toHaveLength(4));

  it("is the frozen flux where nothing condenses, and below it where something does", () => {
    const nitrogen = createFluidModel({ equation: "peng-robinson-1976", components: [{ id: "nitrogen", moleFraction: 1 }] });
    const dry = flashPT(nitrogen, { temperatureK: 290, pressurePa: 1.5e7 });
    const dryState = dry.phases[0]?.state ?? missing();
    for (const back of [101325, 1.2e7]) {
      const both = [equilibriumNozzle(nitrogen, dry, nitrogen.feed, back), frozenNozzle(nitrogen, dryState, nitrogen.feed, back)];
      expect(relative(both[0]?.massFluxKgPerM2S ?? 0, both[1]?.massFluxKgPerM2S ?? 0)).toBeLessThan(1e-9);
    }
    // Carbon dioxide at 60 bar, 300 K: condensation in the throat takes 5 to 15 % off the flux.
    const dioxide = createFluidModel({ equation: "peng-robinson-1976", components: [{ id: "carbon_dioxide", moleFraction: 1 }] });
    const wet = flashPT(dioxide, { temperatureK: 300, pressurePa: 6e6 });
    const ratio =
      equilibriumNozzle(dioxide, wet, dioxide.feed, 101325).massFluxKgPerM2S /
      frozenNozzle(dioxide, wet.phases[0]?.state ?? missing(), dioxide.feed, 101325).massFluxKgPerM2S;
    expect(ratio).toBeGreaterThan(0.85);
    expect(ratio).toBeLessThan(0.95);
  });

  it("is near the reference equation's flux for saturated liquid propane at 10 bar (M3-04: 6862 kg/(m² s), p_t/p0 0.8257)", () => {
    const propane = createFluidModel({ equation: "peng-robinson-1976", components: [{ id: "propane", moleFraction: 1 }] });
    const flow = equilibriumNozzle(propane, flashPQ(propane, { pressurePa: 1e6, vapourMoleFraction: 0 }), propane.feed, 101325);
    // Peng-Robinson's liquid density is 4 % off here; the flux follows.
    expect(relative(flow.massFluxKgPerM2S, 6862)).toBeLessThan(0.03);
    expect(Math.abs(flow.throatPressurePa / 1e6 - 0.8257)).toBeLessThan(0.01);
  });

  it("is the largest flux of all pressures on the isentrope", () => {
    const model = createFluidModel({
      equation: "peng-robinson-1976",
      components: [
        { id: "methane", moleFraction: 0.8 },
        { id: "propane", moleFraction: 0.2 },
      ],
    });
    fc.assert(
      fc.property(
        fc.double({ min: 5e5, max: 1.2e7, noNaN: true }),
        fc.double({ min: 230, max: 350, noNaN: true }),
        (pressurePa, temperatureK) => {
          const stagnation = flashPT(model, { temperatureK, pressurePa });
          const { massFluxKgPerM2S } = equilibriumNozzle(model, stagnation, model.feed, 101325);
          for (const part of [0.9, 0.75, 0.6, 0.5, 0.4, 0.25]) {
            const at = flashPS(model, { pressurePa: part * pressurePa, entropyJPerMolK: stagnation.entropyJPerMolK });
            const flux =
              Math.sqrt(2 * model.mixtureMolarMass(model.feed) * Math.max(stagnation.enthalpyJPerMol - at.enthalpyJPerMol, 0)) /
              at.molarVolumeM3PerMol;
            expect(flux).toBeLessThanOrEqual(massFluxKgPerM2S * (1 + 1e-7));
          }
        },
      ),
      { numRuns: 40 },
    );
  });
});

describe("equilibriumNozzle of a pure fluid, with places found before", () => {
  it.each(["propane", "carbon_dioxide", "water"])("is the largest flux on the isentrope: %s", (id) => {
    const model = createFluidModel({ equation: "peng-robinson-1976", components: [{ id, moleFraction: 1 }] });
    const Tc = model.criticalTemperaturesK[0] ?? missing();
    const pc = model.criticalPressuresPa[0] ?? missing();
    const hints = createEquilibriumHints();
    fc.assert(
      fc.property(
        fc.double({ min: 0.72, max: 1.3, noNaN: true }),
        fc.double({ min: 0.1, max: 2.4, noNaN: true }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (reducedT, reducedP, quality) => {
          const saturated = reducedT < 0.93 && reducedP < 0.6;
          const stagnation = saturated
            ? flashTQ(model, { temperatureK: reducedT * Tc, vapourMoleFraction: quality })
            : flashPT(model, { temperatureK: reducedT * Tc, pressurePa: reducedP * pc });
          const back = 0.03 * stagnation.pressurePa;
          const near = equilibriumNozzle(model, stagnation, model.feed, back, hints);
          const fresh = equilibriumNozzle(model, stagnation, model.feed, back);
          expect(Math.abs(near.massFluxKgPerM2S / fresh.massFluxKgPerM2S - 1)).toBeLessThan(1e-8);
          for (const part of [0.97, 0.9, 0.75, 0.6, 0.5, 0.4, 0.25, 0.1]) {
            const at = flashPS(model, {
              pressurePa: part * stagnation.pressurePa,
              entropyJPerMolK: stagnation.entropyJPerMolK,
            });
            const flux =
              Math.sqrt(2 * model.mixtureMolarMass(model.feed) * Math.max(stagnation.enthalpyJPerMol - at.enthalpyJPerMol, 0)) /
              at.molarVolumeM3PerMol;
            expect(flux).toBeLessThanOrEqual(near.massFluxKgPerM2S * (1 + 1e-7));
          }
        },
      ),
      { numRuns: 60 },
    );
  });
});

describe("smallestBetween", () => {
  it("finds a smooth minimum and a kink", () => {
    expect(smallestBetween((x) => (x - 0.3) ** 2, 0, 1, 1e-9)).toBeCloseTo(0.3, 7);
    expect(smallestBetween((x) => Math.abs(x - 0.7), 0, 1, 1e-9)).toBeCloseTo(0.7, 7);
  });
});

function missing(): never {
  throw new Error("a phase is missing");
}

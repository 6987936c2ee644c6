import { describe, expect, it } from "vitest";
import type { EquationId } from "../cases/fluid-spec";
import { createFluidModel } from "../eos/create-fluid-model";
import { flashPT } from "./flash-pt";
import { flashPQ, flashTQ } from "./flash-quality";
import { phaseEnvelope } from "./phase-envelope";

const fluids: Record<string, Record<string, number>> = {
  "rich gas of twelve components": {
    methane: 0.7,
    ethane: 0.09,
    propane: 0.06,
    isobutane: 0.02,
    n_butane: 0.03,
    isopentane: 0.01,
    n_pentane: 0.01,
    n_hexane: 0.01,
    n_heptane: 0.005,
    n_octane: 0.005,
    nitrogen: 0.03,
    carbon_dioxide: 0.03,
  },
  "lean gas": { methane: 0.93, ethane: 0.035, propane: 0.01, n_butane: 0.005, nitrogen: 0.01, carbon_dioxide: 0.01 },
  "propane and butane": { propane: 0.6, n_butane: 0.4 },
  "methane and propane": { methane: 0.3, propane: 0.7 },
};

const model = (composition: Record<string, number>, equation: EquationId = "peng-robinson-1976") =>
  createFluidModel({
    equation,
    components: Object.entries(composition).map(([id, moleFraction]) => ({ id, moleFraction })),
  });

describe("the phase envelope", () => {
  for (const [name, composition] of Object.entries(fluids)) {
    const fluid = model(composition);
    const envelope = phaseEnvelope(fluid);

    it(`of ${name} runs from the dew line at low pressure over the critical point back to low pressure`, () => {
      expect(envelope.endedBy).toBe("low-pressure");
      expect(envelope.points[0]!.line).toBe("dew");
      expect(envelope.points.at(-1)!.line).toBe("bubble");
      expect(envelope.critical).toBeDefined();
    });

    it(`of ${name} has its maxima above every point of the trace, and by no more than the spacing of the points`, () => {
      const hottest = Math.max(...envelope.points.map(({ temperatureK }) => temperatureK));
      const highest = Math.max(...envelope.points.map(({ pressurePa }) => pressurePa));
      expect(envelope.cricondentherm!.temperatureK).toBeGreaterThanOrEqual(hottest - 1e-6);
      expect(envelope.cricondentherm!.temperatureK).toBeLessThan(hottest * 1.003);
      expect(envelope.cricondenbar!.pressurePa).toBeGreaterThanOrEqual(highest * (1 - 1e-9));
      expect(envelope.cricondenbar!.pressurePa).toBeLessThan(highest * 1.01);
    });

    it(`of ${name} separates one phase from two`, () => {
      const { temperatureK, pressurePa } = envelope.cricondentherm!;
      expect(flashPT(fluid, { temperatureK: temperatureK * 1.001, pressurePa }).phases).toHaveLength(1);
      expect(flashPT(fluid, { temperatureK: temperatureK * 0.999, pressurePa }).phases).toHaveLength(2);
      const top = envelope.cricondenbar!;
      expect(flashPT(fluid, { temperatureK: top.temperatureK, pressurePa: top.pressurePa * 1.002 }).phases).toHaveLength(1);
      expect(flashPT(fluid, { temperatureK: top.temperatureK, pressurePa: top.pressurePa * 0.998 }).phases).toHaveLength(2);
    });

    it(`of ${name} agrees with the bubble and dew flashes`, () => {
      for (const point of envelope.points.filter((_, i) => i % 9 === 4)) {
        // A saturated state is on the line; near the critical point the flash may find the other branch and is left out.
        if (Math.abs(point.temperatureK / envelope.critical!.temperatureK - 1) < 0.05) continue;
        const found =
          point.line === "dew"
            ? point.pressurePa < 2e6 && flashPQ(fluid, { pressurePa: point.pressurePa, vapourMoleFraction: 1 })
            : flashTQ(fluid, { temperatureK: point.temperatureK, vapourMoleFraction: 0 });
        if (!found) continue;
        // Below 107 K a second liquid splits off the rich gas, which the envelope leaves out and the flash does not.
        if (found.phases.length > 2) {
          expect(point.temperatureK).toBeLessThan(110);
          continue;
        }
        expect(Math.abs(found.temperatureK / point.temperatureK - 1)).toBeLessThan(1e-8);
        expect(Math.abs(found.pressurePa / point.pressurePa - 1)).toBeLessThan(1e-8);
      }
    });

    it(`of ${name} has a critical point where the two phases are one`, () => {
      const { temperatureK, pressurePa } = envelope.critical!;
      const inside = flashPT(fluid, { temperatureK, pressurePa: pressurePa * 0.9995 });
      const [light, dense] = inside.phases;
      if (!dense) return;
      expect(light!.state.molarVolumeM3PerMol / dense.state.molarVolumeM3PerMol).toBeLessThan(1.25);
    });
  }

  it("of a mixture that leaves the range in pressure says so instead of closing", () => {
    const envelope = phaseEnvelope(model({ hydrogen: 0.5, methane: 0.3, propane: 0.2 }));
    expect(envelope.critical).toBeUndefined();
    expect(["high-pressure", "lost"]).toContain(envelope.endedBy);
  });

  it("of a pure fluid is its vapour-pressure curve, ending at the critical point", () => {
    const envelope = phaseEnvelope(model({ propane: 1 }));
    expect(envelope.critical!.temperatureK).toBeCloseTo(369.89, 2);
    const top = envelope.points[envelope.points.length / 2 - 1]!;
    expect(top.temperatureK / envelope.critical!.temperatureK).toBeCloseTo(1, 5);
    expect(top.pressurePa / envelope.critical!.pressurePa).toBeCloseTo(1, 3);
  });

  it("by GERG-2008 lies near that by Peng-Robinson for a lean gas", () => {
    const gerg = phaseEnvelope(model(fluids["lean gas"]!, "gerg-2008"));
    const cubic = phaseEnvelope(model(fluids["lean gas"]!));
    expect(gerg.endedBy).toBe("low-pressure");
    expect(Math.abs(gerg.cricondentherm!.temperatureK - cubic.cricondentherm!.temperatureK)).toBeLessThan(4);
    expect(Math.abs(gerg.cricondenbar!.pressurePa / cubic.cricondenbar!.pressurePa - 1)).toBeLessThan(0.05);
  });
});

import { describe, expect, it } from "vitest";
import { equationIds, type FluidSpec } from "../cases/fluid-spec";
import { fitness } from "./fitness";
import { spread } from "./spread";

const fluid = (composition: Record<string, number>): FluidSpec => ({
  equation: "peng-robinson-1976",
  components: Object.entries(composition).map(([id, moleFraction]) => ({ id, moleFraction })),
});
const verdicts = (spec: FluidSpec, temperatureK: number, pressurePa: number) =>
  Object.fromEntries(fitness(spec, { temperatureK, pressurePa }).map((entry) => [entry.equation, entry]));

describe("the fitness of each equation", () => {
  it("puts the reference equation of a pure fluid first and measures the others against it", () => {
    const found = verdicts(fluid({ methane: 1 }), 300, 1e7);
    expect(found.reference!.verdict).toBe("first");
    expect(found["peng-robinson-1976"]!.verdict).toBe("fit");
    expect(found["van-der-waals"]!.verdict).toBe("comparison-only");
    // deviations of Z at this state: SRK +1.8, PR -2.5, RK +0.1, vdW -4.8 % (docs/methods/fitness.md); density is the reciprocal
    expect(found["soave-redlich-kwong"]!.deviation!.densityPercent).toBeCloseTo(-1.8, 0);
    expect(found["peng-robinson-1976"]!.deviation!.densityPercent).toBeCloseTo(2.5, 0);
    expect(found["van-der-waals"]!.deviation!.densityPercent).toBeCloseTo(5, 0);
  });

  it("puts GERG-2008 first for a natural gas and says when its range is left", () => {
    const gas = fluid({ methane: 0.9, ethane: 0.06, nitrogen: 0.04 });
    expect(verdicts(gas, 300, 7e6)["gerg-2008"]!.verdict).toBe("first");
    expect(verdicts(gas, 500, 7e6)["gerg-2008"]!.verdict).toBe("uncertain");
    expect(verdicts(gas, 300, 7e6).reference!.verdict).toBe("not-applicable");
  });

  it("doubts cubic equations near the critical point, with hydrogen, and with water", () => {
    expect(verdicts(fluid({ propane: 1 }), 372, 4.3e6)["peng-robinson-1976"]!.verdict).toBe("uncertain");
    expect(verdicts(fluid({ hydrogen: 0.5, methane: 0.5 }), 300, 1e7)["peng-robinson-1976"]!.verdict).toBe("uncertain");
    expect(verdicts(fluid({ methane: 0.98, water: 0.02 }), 400, 1e6)["soave-redlich-kwong"]!.verdict).toBe("uncertain");
  });
});

describe("the fields of a fitness entry", () => {
  it("hold the state by each equation, the published range, and which phases disagree", () => {
    const found = fitness(fluid({ propane: 1 }), { temperatureK: 300, pressurePa: 2e6 });
    expect(found.map(({ equation }) => equation)).toEqual(equationIds);
    const reference = found.at(-1)!;
    expect(reference.published).toEqual({ temperatureK: [85.525, 650], maximumPressurePa: 1e9, inside: true });
    expect(reference.deviation).toBeUndefined();
    expect(reference.values!.phase).toBe("liquid");
    // liquid propane at 300 K, 20 bar: Lemmon et al. 2009, 491.7 kg/m3 (from memory of the saturated liquid, 489.4, and a little above)
    expect(reference.values!.densityKgPerM3).toBeGreaterThan(489);
    expect(reference.values!.densityKgPerM3).toBeLessThan(496);
    const srk = found.find(({ equation }) => equation === "soave-redlich-kwong")!;
    expect(srk.deviation!.densityPercent).toBeCloseTo(-8, 0); // +8.6 % in Z, docs/methods/fitness.md
    expect(srk.deviation!.otherPhase).toBe(false);
    expect(srk.published).toBeUndefined();
  });

  it("take a volume translation along only where an equation has one", () => {
    const spec: FluidSpec = { ...fluid({ propane: 1 }), volumeTranslation: "library" };
    const found = verdicts(spec, 300, 2e6);
    expect(found["gerg-2008"]!.verdict).toBe("fit");
    expect(Math.abs(found["soave-redlich-kwong"]!.deviation!.densityPercent)).toBeLessThan(4); // 8 without
  });

  it("say when two equations find other phases, between their boiling pressures", () => {
    // saturation of propane at 300 K: reference 9.978 bar; van der Waals boils far above
    const found = verdicts(fluid({ propane: 1 }), 300, 1.05e6);
    expect(found["van-der-waals"]!.deviation!.otherPhase).toBe(true);
  });

  it("refuse a wrong state by the name of its field, and call no state below a triple point fit", () => {
    expect(() => fitness(fluid({ methane: 1 }), { temperatureK: -1, pressurePa: 1e5 })).toThrow(
      expect.objectContaining({ code: "invalid-case", path: "temperatureK" }),
    );
    for (const { verdict } of fitness(fluid({ carbon_dioxide: 1 }), { temperatureK: 200, pressurePa: 1e6 })) {
      expect(["outside-range", "comparison-only"]).toContain(verdict);
    }
  });
});

describe("the spread of a quantity over equations", () => {
  it("gives lowest and highest, and lists a refusal as one", () => {
    const found = spread(
      fluid({ methane: 0.9, ethane: 0.1 }),
      ["peng-robinson-1976", "soave-redlich-kwong", "gerg-2008", "reference"],
      (model) => model.phaseAtPressure(300, 1e7, model.feed).compressibility,
    );
    expect(found.entries).toHaveLength(4);
    expect(found.entries[3]).toHaveProperty("refused");
    expect(found.high! - found.low!).toBeGreaterThan(0.005);
    expect(found.high! - found.low!).toBeLessThan(0.06);
  });

  it("has no range when every equation refuses", () => {
    const found = spread(
      fluid({ methane: 1 }),
      ["peng-robinson-1976"],
      (model) => model.phaseAtPressure(1e6, 1e5, [1]).compressibility,
    );
    expect(found.low).toBeUndefined();
  });
});

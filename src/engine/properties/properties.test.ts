import { describe, expect, it } from "vitest";
import { equationIds, type EquationId, type FluidSpec } from "../cases/fluid-spec";
import type { PathCase } from "../cases/path-case";
import { createFluidModel } from "../eos/create-fluid-model";
import { flashPH } from "../flash/flash-ph";
import { flashPT } from "../flash/flash-pt";
import { phaseEnvelope } from "../flash/phase-envelope";
import { solidWarnings } from "../solids/solid-warnings";
import { carbonDioxideFrostLine } from "./carbon-dioxide-frost";
import { compareChanges } from "./compare-changes";
import { diagramLines } from "./diagram-lines";
import { hydrateLine } from "./hydrate-line";
import { stateProperties } from "./state-properties";

type Amounts = Record<string, number>;

function fluid(amounts: Amounts, equation: EquationId = "peng-robinson-1976"): FluidSpec {
  const sum = Object.values(amounts).reduce((total, x) => total + x, 0);
  const components = Object.entries(amounts).map(([id, x]) => ({ id, moleFraction: x / sum }));
  return { components, equation, interaction: "library" };
}
const model = (amounts: Amounts, equation?: EquationId) => createFluidModel(fluid(amounts, equation));

const richGas: Amounts = {
  ...{ methane: 80, ethane: 8, propane: 4, isobutane: 1, n_butane: 1.5, isopentane: 0.5, n_pentane: 0.5, n_hexane: 0.4 },
  ...{ n_heptane: 0.3, n_octane: 0.2, nitrogen: 1.6, carbon_dioxide: 2 },
};
const point = { temperatureK: 250, pressurePa: 40e5 };

describe("the properties of a state", () => {
  it("are those of the reference equation for methane at 300 K and 100 bar", () => {
    // Setzmann and Wagner 1991, evaluated by a general-purpose library: cv 28.995, cp 48.165 J/(mol K), w 444.53 m/s; viscosity
    // 1.3815e-5 Pa s, which the general correlation meets within its own 10 %.
    const [gas] = stateProperties(model({ methane: 1 }, "reference"), { temperatureK: 300, pressurePa: 100e5 }).phases;
    expect(gas!.heatCapacityVJPerMolK).toBeCloseTo(28.995, 2);
    expect(gas!.heatCapacityPJPerMolK).toBeCloseTo(48.165, 2);
    expect(gas!.soundSpeedMPerS).toBeCloseTo(444.53, 1);
    expect(Math.abs(gas!.viscosityPaS / 1.3815e-5 - 1)).toBeLessThan(0.1);
  });

  it("hold the Joule-Thomson coefficient of an isenthalpic step", () => {
    const gas = model(richGas);
    const at = { temperatureK: 340, pressurePa: 60e5 };
    const state = stateProperties(gas, at);
    const step = 1e4;
    const { temperatureK } = flashPH(gas, { pressurePa: at.pressurePa - step, enthalpyJPerMol: state.overall.enthalpyJPerMol });
    expect((at.temperatureK - temperatureK) / step / state.phases[0]!.jouleThomsonKPerPa).toBeCloseTo(1, 3);
  });

  it("of two phases add up, and the ratios are those of the compositions", () => {
    const state = stateProperties(model(richGas), point);
    expect(state.phase).toBe("two-phase");
    const [vapour, liquid] = state.phases;
    const mean = (key: "molarVolumeM3PerMol" | "enthalpyJPerMol" | "molarMassKgPerMol") =>
      vapour!.moleFraction * vapour![key] + liquid!.moleFraction * liquid![key];
    for (const key of ["molarVolumeM3PerMol", "enthalpyJPerMol", "molarMassKgPerMol"] as const)
      expect(mean(key) / state.overall[key]).toBeCloseTo(1, 10);
    expect(vapour!.massFraction + liquid!.massFraction).toBeCloseTo(1, 12);
    state.components.forEach(({ ratio, moleFraction }, i) => {
      expect(ratio).toBe(vapour!.composition[i]! / liquid!.composition[i]!);
      const total = vapour!.moleFraction * vapour!.composition[i]! + liquid!.moleFraction * liquid!.composition[i]!;
      expect(total).toBeCloseTo(moleFraction, 12);
    });
    expect(liquid!.surfaceTensionNPerM).toBeGreaterThan(0.005);
    expect(vapour!.surfaceTensionNPerM).toBeUndefined();
  });

  it("leave out the surface tension of a liquid that is mostly water", () => {
    const liquid = stateProperties(model({ water: 0.99, methane: 0.01 }), { temperatureK: 300, pressurePa: 100e5 }).phases.at(
      -1,
    )!;
    expect(liquid.kind).toBe("liquid");
    expect(liquid.surfaceTensionNPerM).toBeUndefined();
  });
});

describe("liquid water beside a hydrocarbon liquid", () => {
  it("is named, and the ratios are those of vapour to the other liquid", () => {
    const wet = stateProperties(model({ methane: 0.6, propane: 0.1, n_heptane: 0.2, water: 0.1 }), {
      temperatureK: 300,
      pressurePa: 30e5,
    });
    expect(wet.phases.map(({ kind, aqueous }) => (aqueous ? "water" : kind))).toEqual(["vapour", "liquid", "water"]);
    const heptane = wet.components.findIndex(({ id }) => id === "n_heptane");
    expect(wet.components[heptane]?.ratio).toBe(wet.phases[0]!.composition[heptane]! / wet.phases[1]!.composition[heptane]!);
  });
});

describe("the lines of a diagram", () => {
  it("of vapour share are found again by a flash, and meet in the critical point", () => {
    const rich = model(richGas);
    const { critical, cricondenbar } = phaseEnvelope(rich);
    const { shares, withoutHydrate } = diagramLines(rich, { traced: true, cricondenbarPa: cricondenbar!.pressurePa });
    expect(shares.map(({ vapourMoleFraction }) => vapourMoleFraction)).toEqual([0.9, expect.closeTo(0.1, 12), 0.5]);
    for (const { vapourMoleFraction, points } of shares) {
      const inside = points.filter(({ pressurePa }) => pressurePa > 5e5 && pressurePa < 40e5);
      expect(inside.length).toBeGreaterThan(3);
      for (const point of inside) expect(flashPT(rich, point).vapourMoleFraction).toBeCloseTo(vapourMoleFraction, 5);
      const end = vapourMoleFraction < 0.2 ? points[0]! : points.at(-1)!;
      expect(end.temperatureK / critical!.temperatureK).toBeCloseTo(1, 3);
      expect(end.pressurePa / critical!.pressurePa).toBeCloseTo(1, 2);
    }
    expect(withoutHydrate).toMatch(/no water/);
  });

  it("are left out where the envelope was not traced, and for a pure fluid", () => {
    expect(diagramLines(model(richGas), { traced: false }).shares).toEqual([]);
    expect(diagramLines(model({ propane: 1 }), { traced: true }).shares).toEqual([]);
  });

  it("hold the triple point of pure carbon dioxide", () => {
    expect(diagramLines(model({ carbon_dioxide: 1 }), { traced: true }).triple?.temperatureK).toBe(216.592);
  });
});

describe("the frost line of carbon dioxide", () => {
  it("passes the normal sublimation point of the pure solid, 194.686 K (Span and Wagner 1996)", () => {
    const points = carbonDioxideFrostLine(model({ carbon_dioxide: 1 }), 5e4, 1e7);
    const after = points.findIndex(({ pressurePa }) => pressurePa > 101_325);
    const [a, b] = [points[after - 1]!, points[after]!];
    const share = Math.log(101_325 / a.pressurePa) / Math.log(b.pressurePa / a.pressurePa);
    expect(a.temperatureK + share * (b.temperatureK - a.temperatureK)).toBeCloseTo(194.686, 1);
  });

  it("of a mixture is where the warning of a solid begins", () => {
    const gas = model({ methane: 0.9, carbon_dioxide: 0.1 });
    const points = carbonDioxideFrostLine(gas, 1e5, 1e7);
    expect(points.length).toBeGreaterThan(4);
    const freezes = (temperatureK: number, pressurePa: number) =>
      solidWarnings(gas, flashPT(gas, { temperatureK, pressurePa })).some(({ code }) => code === "solid-carbon-dioxide");
    for (const { temperatureK, pressurePa } of points) {
      expect(freezes(temperatureK - 0.1, pressurePa)).toBe(true);
      expect(freezes(temperatureK + 0.1, pressurePa)).toBe(false);
    }
  });

  it("is empty without carbon dioxide", () => expect(carbonDioxideFrostLine(model({ methane: 1 }), 1e5, 1e7)).toEqual([]));
});

describe("the hydrate line", () => {
  it("rises with pressure where water is present, inside the range of the correlations", () => {
    const found = hydrateLine(model({ methane: 0.9, ethane: 0.08, water: 0.02 }), 1e5, 2e7);
    if (!("points" in found)) throw new Error(found.refused);
    found.points.slice(1).forEach(({ temperatureK }, i) => expect(temperatureK).toBeGreaterThan(found.points[i]!.temperatureK));
    expect(found.points.every(({ temperatureK }) => temperatureK >= 263 && temperatureK <= 301)).toBe(true);
  });

  it("is refused in words without water and for a gas too heavy", () => {
    expect(hydrateLine(model({ methane: 1 }), 1e5, 1e7)).toHaveProperty("refused");
    expect(hydrateLine(model({ propane: 0.98, water: 0.02 }), 1e5, 1e7)).toHaveProperty(
      "refused",
      expect.stringContaining("1.5"),
    );
  });
});

describe("a change of state by every equation", () => {
  const change = (amounts: Amounts): PathCase => ({
    ...{ format: "ebbmark-case/1", kind: "path", fluid: fluid(amounts) },
    from: { temperatureK: 300, pressurePa: 80e5 },
    to: { temperatureK: 260, pressurePa: 20e5 },
  });

  it("lists all of them in order, those that don't apply with their reason", () => {
    const compared = compareChanges(change(richGas));
    expect(compared.map(({ equation }) => equation)).toEqual([...equationIds]);
    const reference = compared.find(({ equation }) => equation === "reference")!;
    expect(reference.result).toBeUndefined();
    expect(reference.refused).toBeTruthy();
    const computed = compared.filter(({ result }) => result);
    expect(computed).toHaveLength(6);
    for (const { result } of computed) {
      const { departureOut, idealGas, departureBack, total } = result!.enthalpyJPerMol;
      expect(departureOut + idealGas + departureBack).toBeCloseTo(total, 8);
    }
  });

  it("takes the worse fitness of the two ends", () => {
    const compared = compareChanges({ ...change({ nitrogen: 1 }), to: { temperatureK: 260, pressurePa: 5e9 / 10 } });
    expect(compared.find(({ equation }) => equation === "gerg-2008")?.verdict).toBe("outside-range");
  });
});

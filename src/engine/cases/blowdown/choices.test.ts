// The choices beyond the plain gas vessel: where the stream leaves, through what, into which surroundings, through which wall.
import { describe, expect, it } from "vitest";
import { plainCase } from "../../../../tests/fixtures/blowdowns";
import { idealGas } from "../../../../tests/fixtures/fluids";
import { EngineError } from "../../errors";
import type { BlowdownCase } from "../blowdown-case";
import type { FluidSpec } from "../fluid-spec";
import { runBlowdown } from "./run-blowdown";

const propane: FluidSpec = { equation: "peng-robinson-1976", components: [{ id: "propane", moleFraction: 1 }] };
const nitrogen: FluidSpec = { equation: "peng-robinson-1976", components: [{ id: "nitrogen", moleFraction: 1 }] };

const drum: BlowdownCase = {
  ...plainCase(propane, { stopPressurePa: 3e5 }),
  vessel: {
    geometry: { shape: "cylinder", orientation: "horizontal", insideDiameterM: 1.2, tangentLengthM: 4, heads: "ellipsoidal-2-1" },
    wall: { steel: "carbon_steel", thicknessM: 0.014, minimumDesignMetalTemperatureK: 244.15 },
  },
  start: { temperatureK: 293.15, liquidVolumeFraction: 0.5 },
  release: {
    path: "orifice",
    diameterM: 0.02,
    dischargeCoefficient: 0.85,
    from: "vapour",
    backPressurePa: 101325,
    openingTimeS: 0,
    flowModel: "frozen",
  },
};
type Place = "vapour" | "liquid" | "whole";
const done = new Map<Place, ReturnType<typeof runBlowdown>>();
const from = (place: Place) => {
  const known = done.get(place) ?? runBlowdown({ ...drum, release: { ...drum.release, from: place } as BlowdownCase["release"] });
  done.set(place, known);
  return known;
};

const relative = (value: number, expected: number) => Math.abs(value / expected - 1);

describe("the place of the outlet", () => {
  it("lets liquid leave faster than the mixture, and that faster than vapour", () => {
    const [vapour, whole, liquid] = [from("vapour"), from("whole"), from("liquid")];
    expect(liquid.summary.peakVentRateKgPerS).toBeGreaterThan(whole.summary.peakVentRateKgPerS);
    expect(whole.summary.peakVentRateKgPerS).toBeGreaterThan(vapour.summary.peakVentRateKgPerS);
    for (const run of [vapour, whole, liquid]) {
      expect(run.summary.massClosure).toBeLessThan(1e-9);
      expect(run.summary.energyClosure).toBeLessThan(1e-6);
      expect(run.summary.endedBy).toBe("pressure");
    }
    expect(liquid.warnings.map((warning) => warning.code)).toContain("equilibrium-outlet");
    expect(vapour.warnings.map((warning) => warning.code)).not.toContain("equilibrium-outlet");
  });

  it("uncovers a liquid outlet: the level falls to nothing and gas follows", () => {
    const { series } = from("liquid");
    expect(series.liquidLevelM?.[0]).toBeCloseTo(0.6, 1);
    expect(series.vapourMoleFraction.at(-1)).toBeGreaterThan(0.98);
    expect(Math.min(...(series.liquidLevelM ?? []))).toBeLessThan(0.03);
  });

  it("keeps the quality of a whole outlet: what is left has the composition that went", () => {
    const mixture: FluidSpec = {
      equation: "peng-robinson-1976",
      components: [
        { id: "propane", moleFraction: 0.6 },
        { id: "n_butane", moleFraction: 0.4 },
      ],
    };
    const { summary } = runBlowdown({
      ...drum,
      fluid: mixture,
      release: { ...drum.release, from: "whole" } as BlowdownCase["release"],
    });
    expect(summary.massClosure).toBeLessThan(1e-9);
  });
});

describe("a control valve", () => {
  it("gives an ideal gas the time of its own law: choked, the rate falls with p/√T", () => {
    const valve = {
      path: "valve",
      cv: 10,
      xt: 0.7,
      from: "vapour",
      backPressurePa: 101325,
      openingTimeS: 0,
      flowModel: "frozen",
    } as const;
    const gas = plainCase(idealGas(1.4, 0.028), { pressurePa: 5e6, stopPressurePa: 1e6, volumeM3: 10 });
    const { summary } = runBlowdown({ ...gas, release: valve });
    // W = 27.3 C Y √(x p1 ρ1) at x = F_γ xT, Y = 2/3: proportional to p/√T like a choked nozzle, so the closed form holds with its τ.
    const tau = summary.initialMassKg / summary.peakVentRateKgPerS;
    expect(relative(summary.endTimeS, (tau / 0.2) * ((1e6 / 5e6) ** (-0.4 / 2.8) - 1))).toBeLessThan(2e-6);
  });

  it("is refused for liquid, by name", () => {
    const valve = {
      path: "valve",
      cv: 10,
      xt: 0.7,
      from: "liquid",
      backPressurePa: 101325,
      openingTimeS: 0,
      flowModel: "frozen",
    } as const;
    expect(() => runBlowdown({ ...drum, release: valve })).toThrow(EngineError);
  });
});

describe("a bore that is searched for", () => {
  const release = {
    path: "sized",
    targetPressurePa: 791325,
    targetTimeS: 900,
    dischargeCoefficient: 0.85,
    from: "vapour",
    backPressurePa: 101325,
    openingTimeS: 0,
    flowModel: "frozen",
  } as const;

  it("meets the target pressure at the target time", () => {
    const base = plainCase(nitrogen, { volumeM3: 30, pressurePa: 7e6, stopPressurePa: 2e5 });
    for (const document of [
      { ...base, release },
      {
        ...base,
        release,
        vessel: { ...base.vessel, wall: { steel: "carbon_steel", thicknessM: 0.03 } },
        heat: {
          inside: { model: "constant", coefficientWPerM2K: 60 },
          wall: { model: "lumped" },
          outside: { model: "constant-heat", heatW: 2e5 },
        },
      } as BlowdownCase,
    ]) {
      const { summary } = runBlowdown(document);
      expect(relative(summary.timeToSixPointNineBarGaugeS ?? 0, 900)).toBeLessThan(2e-4);
      expect(summary.sizedDiameterM).toBeGreaterThan(0.01);
    }
  });

  it("agrees with the closed form of an ideal gas", () => {
    const gas = plainCase(idealGas(1.4, 0.0280134), { volumeM3: 10, pressurePa: 1e7, temperatureK: 300, stopPressurePa: 5e6 });
    // Check M3-05 turned round: 20 mm at C_d 0.84 need 96.52343 s to 50 bar.
    const { summary } = runBlowdown({
      ...gas,
      release: { ...release, dischargeCoefficient: 0.84, targetPressurePa: 5e6, targetTimeS: 96.52343 },
    });
    expect(relative(summary.sizedDiameterM ?? 0, 0.02)).toBeLessThan(1e-4);
  });

  it("is refused for a target that is not below the start", () => {
    expect(() => runBlowdown({ ...plainCase(nitrogen), release: { ...release, targetPressurePa: 6e6 } })).toThrow(
      /below the pressure at start/,
    );
  });
});

describe("fire", () => {
  const burning = (outside: BlowdownCase["heat"]["outside"], over: Partial<BlowdownCase> = {}) =>
    runBlowdown({
      ...drum,
      heat: { inside: { model: "constant", coefficientWPerM2K: 500 }, wall: { model: "lumped" }, outside },
      ...over,
    });

  it("by the wetted-area law starts with the heat of the wetted surface, and says when the wall is dry", () => {
    const fire = { model: "pool-fire", drainage: "adequate", environmentFactor: 1 } as const;
    const { summary, series, cautionIds, warnings } = burning(fire);
    expect(summary.heatFromOutsideJ).toBeGreaterThan(0);
    expect(summary.energyClosure).toBeLessThan(1e-6);
    expect(cautionIds).toContain("C4");
    const dry = series.vapourMoleFraction.at(-1) === 1;
    expect(warnings.some((warning) => warning.code === "dry-in-fire")).toBe(dry);
    expect(() =>
      runBlowdown({
        ...drum,
        vessel: { geometry: { shape: "volume", volumeM3: 5, innerAreaM2: 15 } },
        heat: { inside: { model: "none" }, wall: { model: "none" }, outside: fire },
      }),
    ).toThrow(/wetted surface/);
  });

  it("on the surface heats the wall the more the hotter the fire", () => {
    const heat = (["open-pool", "confined-pool", "jet"] as const).map(
      (basis) =>
        burning({ model: "surface-fire", basis }, { run: { ...drum.run, stopTimeS: 200 } }).summary.heatFromOutsideJ / 200,
    );
    expect(heat[0]).toBeLessThan(heat[1] ?? 0);
    expect(heat[1]).toBeLessThan(heat[2] ?? 0);
    const given = burning(
      { model: "surface-fire", basis: "jet", heatFluxWPerM2: 60000 },
      { run: { ...drum.run, stopTimeS: 50 } },
    );
    expect(relative(given.summary.heatFromOutsideJ, 60000 * 17.9 * given.summary.endTimeS)).toBeLessThan(0.02);
  });
});

describe("the wall's own temperature profile", () => {
  const thick = (model: "lumped" | "conduction", thicknessM: number) => {
    const base = plainCase(nitrogen, { pressurePa: 1.5e7, volumeM3: 1, diameterM: 0.02 });
    return runBlowdown({
      ...base,
      vessel: {
        ...base.vessel,
        wall: { steel: "carbon_steel", thicknessM, massKg: 7850 * 6 * thicknessM, specificHeatJPerKgK: 470 },
      },
      heat: { inside: { model: "constant", coefficientWPerM2K: 200 }, wall: { model }, outside: { model: "adiabatic" } },
    });
  };

  it("is colder inside than a lump, by little for a thin wall and more for a thick one", () => {
    for (const [thicknessM, least, most] of [
      [0.005, -0.3, 0.3],
      [0.05, 0.1, 6],
    ] as const) {
      const difference =
        (thick("lumped", thicknessM).summary.minimumWallTemperatureK ?? 0) -
        (thick("conduction", thicknessM).summary.minimumWallTemperatureK ?? 0);
      expect(difference).toBeGreaterThan(least);
      expect(difference).toBeLessThan(most);
    }
  });

  it("closes, and a lump that is too thick says so", () => {
    const run = thick("conduction", 0.05);
    expect(run.summary.energyClosure).toBeLessThan(1e-6);
    expect(thick("lumped", 0.05).warnings.map((warning) => warning.code)).toContain("thick-wall");
    expect(run.cautions[1]).toMatch(/varies through its thickness/);
  });

  it("lets insulation stand in the way of the surroundings", () => {
    const base = plainCase(nitrogen);
    const warmed = (insulation?: { thicknessM: number; conductivityWPerMK: number }) =>
      runBlowdown({
        ...base,
        vessel: { ...base.vessel, wall: { steel: "carbon_steel", thicknessM: 0.01, ...(insulation ? { insulation } : {}) } },
        heat: {
          inside: { model: "constant", coefficientWPerM2K: 60 },
          wall: { model: "conduction" },
          outside: { model: "ambient", temperatureK: 320, coefficientWPerM2K: 20 },
        },
      }).summary.heatFromOutsideJ;
    expect(warmed({ thicknessM: 0.05, conductivityWPerMK: 0.04 })).toBeLessThan(0.1 * warmed());
  });
});

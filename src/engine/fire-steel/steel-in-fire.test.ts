import { describe, expect, it } from "vitest";
import { runBlowdown } from "../cases/blowdown/run-blowdown";
import type { BlowdownCase } from "../cases/blowdown-case";

const base: BlowdownCase = {
  format: "ebbmark-case/1",
  kind: "blowdown",
  fluid: { equation: "peng-robinson-1976", components: [{ id: "nitrogen", moleFraction: 1 }] },
  vessel: {
    geometry: {
      shape: "cylinder",
      orientation: "horizontal",
      insideDiameterM: 1.475,
      tangentLengthM: 4,
      heads: "ellipsoidal-2-1",
    },
    wall: { steel: "carbon_steel", thicknessM: 0.025, designPressurePa: 7e6 },
  },
  start: { pressurePa: 6e6, temperatureK: 293.15 },
  release: {
    path: "orifice",
    diameterM: 0.02,
    dischargeCoefficient: 0.85,
    from: "vapour",
    backPressurePa: 101325,
    openingTimeS: 0,
    flowModel: "frozen",
  },
  heat: {
    inside: { model: "constant", coefficientWPerM2K: 50 },
    wall: { model: "lumped" },
    outside: { model: "surface-fire", basis: "open-pool" },
  },
  run: { stopTimeS: 1500, stopPressurePa: 2e5, relativeTolerance: 1e-5 },
  limits: { targetPressurePa: 3.5e6, targetTimeS: 900 },
};
const run = (over: Partial<BlowdownCase>) => runBlowdown({ ...base, ...over }, { coarse: true });

describe("steel in a fire", () => {
  it("holds while the pressure falls and ruptures while it does not", () => {
    const { steelInFire, limits, cautionIds } = run({});
    expect(steelInFire?.depressurisationWins).toBe(true);
    expect(steelInFire?.items[0]?.ruptureTimeS).toBeUndefined();
    expect(steelInFire?.items[0]?.ruptureTimeShutInS).toBeGreaterThan(300);
    expect(steelInFire?.shutInPressurePa).toBe(7e6);
    expect(limits.find(({ id }) => id === "least-strength-ratio")?.value).toBe(steelInFire?.items[0]?.leastRatio);
    expect(cautionIds).toContain("M-rupture");
  });

  it("loses against a fire that is fed faster than a small bore empties the vessel", () => {
    const { steelInFire, verdict } = run({
      release: { ...base.release, diameterM: 0.004 } as BlowdownCase["release"],
      steelInFire: { basis: "jet" },
    });
    expect(steelInFire?.depressurisationWins).toBe(false);
    expect(steelInFire?.verdict).toBe("beyond");
    expect(steelInFire?.sentence).toMatch(/ruptures after about/);
    expect(verdict).toBe("beyond");
  });

  it("lets more flux rupture no later, and thinner steel heat up faster", () => {
    const { steelInFire } = run({
      release: { ...base.release, diameterM: 0.004 } as BlowdownCase["release"],
      steelInFire: {
        basis: "jet",
        items: [
          { name: "thin", steel: "carbon_steel", insideDiameterM: 0.15, thicknessM: 0.005 },
          { name: "thick", steel: "carbon_steel", insideDiameterM: 0.15, thicknessM: 0.02 },
        ],
      },
    });
    const [shell, thin, thick] = steelInFire?.items ?? [];
    expect(shell?.ruptureTimeAtMoreFluxS).toBeLessThan(shell?.ruptureTimeS ?? 0);
    expect(thin?.timeTo400CelsiusS).toBeLessThan(thick?.timeTo400CelsiusS ?? 0);
    expect(steelInFire?.items.filter((item) => item.governs)).toHaveLength(1);
  });

  it("keeps wetted steel near its liquid until the liquid is gone", () => {
    const { steelInFire, series } = run({
      fluid: { equation: "peng-robinson-1976", components: [{ id: "propane", moleFraction: 1 }] },
      start: { temperatureK: 293.15, liquidVolumeFraction: 0.5 },
      run: { ...base.run, stopTimeS: 300 },
      limits: {},
    });
    const wet = steelInFire?.items.find((item) => item.part === "wet");
    const dry = steelInFire?.items.find((item) => item.part === "dry");
    expect(series.liquidLevelM?.at(-1)).toBeGreaterThan(0);
    expect(wet?.hottestWallK).toBeLessThan(Math.max(...series.fluidTemperatureK) + 51);
    expect(dry?.hottestWallK).toBeGreaterThan(wet?.hottestWallK ?? 0);
  });

  it("gets worse with every minute that the valve opens late", () => {
    const { steelInFire } = run({ steelInFire: { lateByS: [0, 180, 420] } });
    const ratios = (steelInFire?.late ?? []).map((late) => ("leastRatio" in late ? late.leastRatio : Number.NaN));
    expect(ratios).toHaveLength(3);
    expect(ratios[0]).toBeCloseTo(steelInFire?.items[0]?.leastRatio ?? 0, 2);
    expect(ratios[1]).toBeLessThan(ratios[0] ?? 0);
    expect(ratios[2]).toBeLessThan(ratios[1] ?? 0);
  });

  it("is left out without a fire and for a plain volume, whose diameter nobody knows", () => {
    expect(run({ heat: { ...base.heat, outside: { model: "adiabatic" } } }).steelInFire).toBeUndefined();
    const plain = {
      geometry: { shape: "volume", volumeM3: 8, innerAreaM2: 25 },
      wall: base.vessel.wall,
    } as BlowdownCase["vessel"];
    expect(run({ vessel: plain }).steelInFire).toBeUndefined();
  });

  it("warns that the usual fifteen minutes do not hold for a thinner wall", () => {
    const thin = { ...base.vessel, wall: { steel: "carbon_steel", thicknessM: 0.012 } };
    expect(run({ vessel: thin }).warnings.map(({ code }) => code)).toContain("rule-wall-thickness");
    expect(run({}).warnings.map(({ code }) => code)).not.toContain("rule-wall-thickness");
  });
});

import { describe, expect, it } from "vitest";
import { plainCase } from "../../../tests/fixtures/blowdowns";
import { runBlowdown } from "../cases/blowdown/run-blowdown";
import type { BlowdownCase, LimitSpec } from "../cases/blowdown-case";
import { swelledShare } from "./carry-over";

const fluid = (parts: Record<string, number>): BlowdownCase["fluid"] => ({
  equation: "peng-robinson-1976",
  components: Object.entries(parts).map(([id, moleFraction]) => ({ id, moleFraction })),
});
const line = (document: BlowdownCase, id: string) =>
  runBlowdown(document, { coarse: true }).limits.find((limit) => limit.id === id);

describe("distance to solid", () => {
  it("is nought or less where solid ended the run", () => {
    const dense = plainCase(fluid({ carbon_dioxide: 1 }), { pressurePa: 8e6, temperatureK: 290, stopPressurePa: 1.2e5 });
    expect(line(dense, "solids")).toMatchObject({ verdict: "beyond", governs: expect.any(Boolean) as boolean });
    expect(line(dense, "solids")?.value).toBeLessThanOrEqual(0);
  });

  it("is the distance from the triple point for a gas that stays above it", () => {
    const warm = plainCase(fluid({ carbon_dioxide: 1 }), { pressurePa: 1e6, temperatureK: 300, stopPressurePa: 9e5 });
    const { summary, limits } = runBlowdown(warm);
    const inHand = limits.find(({ id }) => id === "solids")?.value ?? 0;
    // At 9 bar the sublimation line does not reach: solid begins at the triple point.
    expect(inHand).toBeCloseTo(summary.minimumFluidTemperatureK - 216.592, 1);
  });

  it("looks at carbon dioxide of a gas behind the opening too, and not at fluids without it", () => {
    const mix = plainCase(fluid({ methane: 0.6, carbon_dioxide: 0.4 }), {
      pressurePa: 1.2e7,
      temperatureK: 250,
      stopPressurePa: 6e6,
    });
    expect(line(mix, "solids-behind-opening")?.verdict).toBe("beyond");
    const lean = plainCase(fluid({ methane: 0.9, nitrogen: 0.1 }), { stopPressurePa: 3e6 });
    expect(line(lean, "solids")).toBeUndefined();
    expect(line(lean, "solids-behind-opening")).toBeUndefined();
  });
});

describe("distance to hydrate", () => {
  const wet = (limits: LimitSpec, temperatureK: number): BlowdownCase => ({
    ...plainCase(fluid({ methane: 0.92, ethane: 0.08 }), { pressurePa: 6e6, temperatureK, stopPressurePa: 5.5e6 }),
    limits,
  });

  it("is asked only where water is there, and holds 3 K over the higher correlation", () => {
    expect(line(wet({}, 330), "hydrate")).toBeUndefined();
    expect(line(wet({ waterPresent: true }, 330), "hydrate")).toMatchObject({ verdict: "within", limit: 3 });
    expect(line(wet({ waterPresent: true }, 290), "hydrate")?.verdict).not.toBe("within");
    expect(line(wet({ waterPresent: true }, 282), "hydrate")?.verdict).toBe("beyond");
  });

  it("stays open for a gas that the correlations do not hold for", () => {
    const heavy = {
      ...plainCase(fluid({ nitrogen: 0.2, carbon_dioxide: 0.8 }), { pressurePa: 3e6, stopPressurePa: 2.5e6 }),
      limits: { waterPresent: true },
    };
    expect(line(heavy, "hydrate")).toMatchObject({ verdict: "open", note: expect.stringMatching(/gravity/) as string });
  });
});

describe("liquid carried over", () => {
  const swelling = {
    levelM: 1,
    heightM: 2,
    surfaceM2: 3,
    vapourRateKgPerS: 2,
    vapourDensityKgPerM3: 20,
    liquidDensityKgPerM3: 500,
    surfaceTensionNPerM: 0.01,
  };

  it("agrees with the figures worked out by hand", () => {
    // j = 2/(20·3) = 0.033333 m/s; u = 1.53 (0.01·9.80665·480/500²)^¼ = 0.179223 m/s; void = 0.033333/(0.358446 + 0.05) = 0.081610
    expect(swelledShare(swelling)).toBeCloseTo(1 / (1 - 0.08161) / 2, 4);
  });

  it("grows with the vapour that leaves and is the level itself without any", () => {
    expect(swelledShare({ ...swelling, vapourRateKgPerS: 0 })).toBe(0.5);
    expect(swelledShare({ ...swelling, vapourRateKgPerS: 40 })).toBeGreaterThan(swelledShare(swelling));
    expect(swelledShare({ ...swelling, levelM: 2 })).toBe(1);
  });

  it("is a line where liquid boils below a gas outlet, open where the shape is unknown", () => {
    const drum: BlowdownCase = {
      ...plainCase(fluid({ propane: 1 }), { diameterM: 0.02, stopPressurePa: 5e5 }),
      start: { temperatureK: 298.15, liquidVolumeFraction: 0.6 },
    };
    expect(line(drum, "liquid-carry-over")).toMatchObject({ verdict: "open" });
    const sphere = { ...drum, vessel: { geometry: { shape: "sphere", insideDiameterM: 1.5 } } } as BlowdownCase;
    expect(line(sphere, "liquid-carry-over")?.value).toBeGreaterThan(0.5);
  });
});

import { describe, expect, it } from "vitest";
import type { BlowdownCase } from "../blowdown-case";
import { runBlowdown } from "./run-blowdown";

const separator = (from: "vapour" | "liquid"): BlowdownCase => ({
  format: "ebbmark-case/1",
  kind: "blowdown",
  fluid: {
    equation: "peng-robinson-1976",
    components: Object.entries({
      methane: 0.5,
      ethane: 0.1,
      propane: 0.1,
      n_butane: 0.05,
      n_hexane: 0.1,
      n_octane: 0.05,
      water: 0.1,
    }).map(([id, moleFraction]) => ({ id, moleFraction })),
  },
  vessel: { geometry: { shape: "volume", volumeM3: 20 } },
  start: { pressurePa: 5e6, temperatureK: 310 },
  release: {
    path: "orifice",
    diameterM: 0.03,
    dischargeCoefficient: 0.85,
    from,
    backPressurePa: 101325,
    openingTimeS: 0,
    flowModel: "frozen",
  },
  heat: { inside: { model: "none" }, wall: { model: "none" }, outside: { model: "adiabatic" } },
  run: { stopTimeS: from === "liquid" ? 60 : 7200, stopPressurePa: 5e5, relativeTolerance: 1e-5 },
});

describe("a separator with gas, condensate and water", () => {
  it("blows down with three phases, closes, and says what is known of the water", () => {
    const { summary, warnings, series } = runBlowdown(separator("vapour"));
    expect(summary.endedBy).toBe("pressure");
    expect(summary.energyClosure).toBeLessThan(1e-6);
    // the dry gas would end far colder: water gives its heat to the rest
    expect(summary.minimumFluidTemperatureK).toBeGreaterThan(255);
    expect(series.vapourMoleFraction[0]).toBeCloseTo(0.5545, 3); // as the PT flash at 310 K and 50 bar
    expect(warnings.find(({ code }) => code === "free-water")?.message).toMatch(
      /^At the start: Liquid water stands as a third phase at 310\.00 K/,
    );
  });

  it("warns that a liquid outlet would drain the water first", () => {
    expect(runBlowdown(separator("liquid")).warnings.map(({ code }) => code)).toContain("water-at-the-bottom");
  });
});

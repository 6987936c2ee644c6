/** Where a phase appears, film and outlet change by degrees: the run goes through instead of meeting the same boundary for ever. */
import { describe, expect, it } from "vitest";
import type { BlowdownCase } from "../blowdown-case";
import { runBlowdown } from "./run-blowdown";

const vessel = (insideDiameterM: number, tangentLengthM: number): BlowdownCase["vessel"] => ({
  geometry: { shape: "cylinder", orientation: "horizontal", insideDiameterM, tangentLengthM, heads: "ellipsoidal-2-1" },
  wall: { steel: "carbon_steel", thicknessM: 0.03 },
});

function run(fluid: Record<string, number>, of: Pick<BlowdownCase, "vessel" | "start">, diameterM: number) {
  return runBlowdown({
    format: "ebbmark-case/1",
    kind: "blowdown",
    fluid: {
      components: Object.entries(fluid).map(([id, moleFraction]) => ({ id, moleFraction })),
      equation: "peng-robinson-1976",
      interaction: "library",
    },
    ...of,
    release: {
      path: "orifice",
      diameterM,
      dischargeCoefficient: 0.85,
      from: "vapour",
      backPressurePa: 101325,
      openingTimeS: 0,
      flowModel: "frozen",
    },
    heat: { inside: { model: "correlations" }, wall: { model: "lumped" }, outside: { model: "adiabatic" } },
    run: { stopTimeS: 900, stopPressurePa: 150000, relativeTolerance: 1e-5 },
  });
}

describe("the onset of a phase", () => {
  it("in a vessel full of liquid: it boils and stays at its saturation, never along the stretched liquid", () => {
    const { summary, series } = run(
      { propane: 1 },
      { vessel: vessel(1, 3), start: { pressurePa: 5e6, temperatureK: 293 } },
      0.01,
    );
    expect(summary.endedBy).toBe("time");
    // Saturated propane holds 636 kPa at 283 K and 837 kPa at 293 K (reference equation); a tonne of it cannot be gone in 15 min.
    expect(summary.finalPressurePa).toBeGreaterThan(4e5);
    expect(Math.max(...series.vapourMoleFraction)).toBeGreaterThan(0.001);
  });

  it("at the dew line of a sour gas: a little condensate lies on a warm wall, and dries up later", () => {
    const { summary, series } = run(
      { methane: 0.7, hydrogen_sulfide: 0.2, carbon_dioxide: 0.1 },
      { vessel: vessel(1.5, 5), start: { pressurePa: 8e6, temperatureK: 300 } },
      0.02,
    );
    expect(summary.endedBy).toBe("pressure");
    expect(Math.min(...series.vapourMoleFraction)).toBeLessThan(1);
    expect(series.vapourMoleFraction.at(-1)).toBe(1);
  });

  it("near a critical point: ethane and carbon dioxide", () => {
    const { summary } = run(
      { ethane: 0.5, carbon_dioxide: 0.5 },
      { vessel: vessel(1, 3), start: { pressurePa: 6.3e6, temperatureK: 292 } },
      0.01,
    );
    expect(["time", "pressure"]).toContain(summary.endedBy);
    expect(summary.massClosure).toBeLessThan(1e-6);
  });
});

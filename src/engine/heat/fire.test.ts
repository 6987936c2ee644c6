import type { BlowdownCase } from "../cases/blowdown-case";
import { measureVessel, type VesselShape } from "../vessel/geometry";
import { environmentFactorOf, fluxBehind } from "./fire-proofing";
import { outsideHeat } from "./outside-heat";
import { describe, expect, it } from "vitest";
import { poolFireHeatW } from "./pool-fire";
import { fireFluxWPerM2, fireSets, type FireBasis } from "./surface-fire";

describe("poolFireHeatW", () => {
  // M6-01 of tests/fixtures/checks/methods.json, recomputed from the published law; the Btu form of it converts to 43 192 and 70 959.
  it("takes 1.06817 and 1.75308 MW into 50 m²", () => {
    expect(poolFireHeatW(50, "adequate", 1) / 1.06817e6 - 1).toBeCloseTo(0, 5);
    expect(poolFireHeatW(50, "inadequate", 1) / 1.75308e6 - 1).toBeCloseTo(0, 5);
    const btuPerH = 1055.05585262 / 3600;
    expect(Math.abs((21000 * btuPerH * (1 / 0.3048 ** 2) ** 0.82) / 43200 - 1)).toBeLessThan(1e-3);
  });
  it("is nothing on a dry vessel, and less behind insulation", () => {
    expect(poolFireHeatW(0, "adequate", 1)).toBe(0);
    expect(poolFireHeatW(50, "adequate", 0.3)).toBeCloseTo(0.3 * poolFireHeatW(50, "adequate", 1), 6);
  });
});

describe("fireFluxWPerM2", () => {
  // M6-04: the set of the open pool, 95.50 kW/m² at 20 °C and 59.50 at 600 °C (own Python).
  it("of an open pool is 95.50 kW/m² on cold and 59.50 on hot steel", () => {
    expect(Math.abs(fireFluxWPerM2("open-pool", 293.15) / 95500 - 1)).toBeLessThan(1e-4);
    expect(Math.abs(fireFluxWPerM2("open-pool", 873.15) / 59500 - 1)).toBeLessThan(1e-4);
  });
  it.each([
    ["open-pool", 45, 130],
    ["confined-pool", 100, 250],
    ["jet", 100, 400],
  ] as [FireBasis, number, number][])("of %s begins within the published range", (basis, low, high) => {
    const first = fireFluxWPerM2(basis, 293.15) / 1000;
    expect(first).toBeGreaterThan(low);
    expect(first).toBeLessThan(high);
    expect(fireFluxWPerM2(basis, fireSets[basis].flameTemperatureK + 200)).toBeLessThan(0);
  });
});

describe("fire proofing and the reach of flames", () => {
  const layer = { thicknessM: 0.025, conductivityWPerMK: 0.5 };

  it("M6-02: environment factor of a conductance of 22.71 W/(m² K) at 15.6 °C is 0.303", () => {
    expect(environmentFactorOf({ thicknessM: 1 / 22.71, conductivityWPerMK: 1 }, 288.75)).toBeCloseTo(0.303, 3);
    expect(environmentFactorOf({ thicknessM: 1e-6, conductivityWPerMK: 1 }, 288.75)).toBe(1);
  });

  it("passes what the layer conducts: the fire's flux at its outer side equals the flux through it", () => {
    const fire = (T: number) => fireFluxWPerM2("open-pool", T);
    const steelK = 300;
    const q = fluxBehind(layer, fire, steelK);
    expect(Math.abs(fire(steelK + (q * layer.thicknessM) / layer.conductivityWPerMK) / q - 1)).toBeLessThan(1e-6);
    expect(q).toBeLessThan(0.3 * fire(steelK));
    expect(fluxBehind({ ...layer, thicknessM: 1e-7 }, fire, steelK) / fire(steelK)).toBeCloseTo(1, 3);
  });

  it("ends at 7.6 m above the ground, for a sphere not below its equator", () => {
    const heat = (geometry: VesselShape, bottomAboveGroundM?: number) => {
      const vessel = measureVessel(geometry);
      const outside = outsideHeat(
        {
          vessel: { geometry },
          heat: {
            inside: { model: "none" },
            wall: { model: "none" },
            outside: {
              model: "pool-fire",
              drainage: "adequate",
              environmentFactor: 1,
              ...(bottomAboveGroundM === undefined ? {} : { bottomAboveGroundM }),
            },
          },
        } as BlowdownCase,
        vessel,
      );
      return outside(300, vessel.volumeM3);
    };
    const column: VesselShape = {
      shape: "cylinder",
      orientation: "vertical",
      insideDiameterM: 2,
      tangentLengthM: 12,
      heads: "flat",
    };
    // From 2 m to 7.6 m: the bottom and 5.6 m of shell.
    expect(heat(column, 2) / (43200 * (Math.PI + Math.PI * 2 * 5.6) ** 0.82)).toBeCloseTo(1, 6);
    expect(heat(column) / (43200 * (2 * Math.PI + Math.PI * 2 * 12) ** 0.82)).toBeCloseTo(1, 6);
    expect(heat(column, 8)).toBe(0);
    const sphere: VesselShape = { shape: "sphere", insideDiameterM: 4 };
    expect(heat(sphere, 10) / (43200 * (8 * Math.PI) ** 0.82)).toBeCloseTo(1, 6);
  });
});

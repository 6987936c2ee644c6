import { describe, expect, it } from "vitest";
import { idealGas } from "../../../tests/fixtures/fluids";
import { plainCase } from "../../../tests/fixtures/blowdowns";
import { runBlowdown } from "../cases/blowdown/run-blowdown";
import { makeWall } from "../cases/blowdown/wall";
import type { BlowdownCase } from "../cases/blowdown-case";
import { createFluidModel } from "../eos/create-fluid-model";
import { flashTV } from "../start/flash-tv";
import { measureVessel } from "../vessel/geometry";
import { afterwards, type EndOfRun } from "./afterwards";

const gas = idealGas(1.4, 0.028);
const wallSpec = {
  steel: "carbon_steel",
  thicknessM: 0.02,
  massKg: 1000,
  specificHeatJPerKgK: 470,
  minimumDesignMetalTemperatureK: 250,
};
const heat: BlowdownCase["heat"] = {
  inside: { model: "constant", coefficientWPerM2K: 50 },
  wall: { model: "lumped" },
  outside: { model: "ambient", temperatureK: 290, coefficientWPerM2K: 10 },
};
const geometry = { shape: "volume", volumeM3: 1, innerAreaM2: 8 } as const;

/** A vessel that ended at a low pressure with its steel and gas at 230 K. */
function ended(over: Partial<EndOfRun> = {}): EndOfRun {
  const fluid = createFluidModel(gas);
  const totalMolesMol = 60;
  const state = flashTV(fluid, { temperatureK: 230, molarVolumeM3PerMol: 1 / totalMolesMol });
  return {
    fluid,
    volumeM3: 1,
    areaM2: 8,
    composition: fluid.feed,
    totalMolesMol,
    internalEnergyJ: totalMolesMol * state.internalEnergyJPerMol,
    temperatureK: 230,
    startTemperatureK: 290,
    wall: makeWall("lumped", wallSpec, measureVessel(geometry), 290),
    wallMeanK: 230,
    coldestSteelK: 230,
    ...over,
  };
}
const given = (over: Partial<BlowdownCase["vessel"]["wall"]> = {}): Pick<BlowdownCase, "heat" | "vessel"> => ({
  heat,
  vessel: { geometry, wall: { ...wallSpec, ...over } },
});

describe("warming up again", () => {
  const R = 8.314462618;
  const gasHeat = (60 * R) / 0.4;

  it("takes the time of one lump in still surroundings, which has a closed form for constant heat capacities", () => {
    const found = afterwards(given(), ended());
    const exact = ((1000 * 470 + gasHeat) / (10 * 8)) * Math.log((290 - 230) / (290 - 250));
    expect(found?.rewarm?.state).toBe("rewarms");
    expect((found?.rewarm?.timeS ?? 0) / exact - 1).toBeCloseTo(0, 4);
    expect(found?.rewarm?.lowS).toBeCloseTo((found?.rewarm?.timeS ?? 0) / 2, 9);
    expect(found?.rewarm?.highS).toBeCloseTo((found?.rewarm?.timeS ?? 0) * 1.5, 9);
  });

  it("takes longer under insulation, in series with the outside film", () => {
    const bare = afterwards(given(), ended())?.rewarm?.timeS ?? 0;
    const under = afterwards(given({ insulation: { thicknessM: 0.05, conductivityWPerMK: 0.05 } }), ended())?.rewarm?.timeS ?? 0;
    expect(under / bare).toBeCloseTo((1 / 10 + 1) / (1 / 10), 6);
  });

  it("says that steel goes on cooling while colder fluid evens out with it", () => {
    const warm = ended({ wallMeanK: 260, coldestSteelK: 260 });
    const found = afterwards(given(), warm)?.rewarm;
    const even = (1000 * 470 * 260 + gasHeat * 230) / (1000 * 470 + gasHeat);
    expect(found?.coldestAfterwardsK).toBeCloseTo(even, 2);
    expect(found?.state).toBe("already-above");
  });

  it("needs no state of the fluid at the temperature of steel that comes out of a fire", () => {
    const glowing = ended({ wallMeanK: 1300, coldestSteelK: 1300, temperatureK: 600 });
    const found = afterwards(given(), {
      ...glowing,
      fluid: { ...glowing.fluid, temperatureRangeK: [50, 1000] } as EndOfRun["fluid"],
    })?.rewarm;
    expect(found).toMatchObject({ state: "already-above", coldestAtStopK: 1300, coldestAfterwardsK: 600 });
  });

  it("never warms above its rating where the surroundings are colder than that", () => {
    expect(afterwards(given({ minimumDesignMetalTemperatureK: 295 }), ended())?.rewarm).toMatchObject({ state: "never" });
    expect(afterwards(given({ minimumDesignMetalTemperatureK: 295 }), ended())?.rewarm?.timeS).toBeUndefined();
  });

  it("leaves the steel out where nothing is rated, and names what it assumed of the surroundings", () => {
    const found = afterwards(
      { heat: { ...heat, outside: { model: "adiabatic" } }, vessel: { geometry } },
      ended({ wall: undefined }),
    );
    expect(found?.rewarm).toBeUndefined();
    expect(found?.assumed).toHaveLength(2);
    expect(found?.surroundings).toEqual({ temperatureK: 290, coefficientWPerM2K: 8 });
  });
});

describe("closed in", () => {
  it("follows the ideal gas at constant volume, with a band of ten kelvins", () => {
    const { closedIn } = afterwards(given(), ended()) ?? {};
    expect(closedIn?.pressurePa).toBeCloseTo(60 * 8.314462618 * 290, 0);
    expect(closedIn?.highPa).toBeCloseTo(60 * 8.314462618 * 300, 0);
    expect(closedIn?.lowPa).toBeCloseTo(60 * 8.314462618 * 280, 0);
  });

  it("comes back to the pressure of saturation while liquid is left", () => {
    const propane = { equation: "peng-robinson-1976", components: [{ id: "propane", moleFraction: 1 }] } as const;
    const drum: BlowdownCase = {
      ...plainCase(propane, { diameterM: 0.02, stopPressurePa: 3e5 }),
      start: { temperatureK: 298.15, liquidVolumeFraction: 0.6 },
    };
    const { afterwards: after, summary } = runBlowdown(drum);
    expect(summary.finalPressurePa).toBeCloseTo(3e5, 0);
    expect(after?.closedIn.temperatureK).toBeCloseTo(298.15, 6);
    expect((after?.closedIn.pressurePa ?? 0) / summary.initialPressurePa).toBeCloseTo(1, 6);
  });
});

import { describe, expect, it } from "vitest";
import { runBlowdown } from "../cases/blowdown/run-blowdown";
import type { BlowdownCase } from "../cases/blowdown-case";
import type { SizingCase } from "../cases/sizing-case";
import { runSizing } from "./run-sizing";
import { withBore } from "./figures-of-bore";
import { windowOf } from "./window";

/** A nitrogen vessel: cold with steel of its own and warm surroundings, in fire with a steady flux. */
const cold: BlowdownCase = {
  format: "ebbmark-case/1",
  kind: "blowdown",
  fluid: { equation: "peng-robinson-1976", components: [{ id: "nitrogen", moleFraction: 1 }] },
  vessel: {
    geometry: { shape: "volume", volumeM3: 10, innerAreaM2: 28 },
    wall: { steel: "carbon_steel", thicknessM: 0.01, minimumDesignMetalTemperatureK: 247 },
  },
  start: { pressurePa: 8e6, temperatureK: 280 },
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
    inside: { model: "constant", coefficientWPerM2K: 100 },
    wall: { model: "lumped" },
    outside: { model: "ambient", temperatureK: 280, coefficientWPerM2K: 25 },
  },
  run: { stopTimeS: 7200, stopPressurePa: 2e5, relativeTolerance: 1e-6 },
};
const fire: BlowdownCase = {
  ...cold,
  start: { pressurePa: 8e6, temperatureK: 300 },
  heat: { ...cold.heat, outside: { model: "surface-fire", basis: "open-pool", heatFluxWPerM2: 3e4 } },
  limits: { targetPressurePa: 7.9e5, targetTimeS: 1200, ventCapacityKgPerS: 3 },
};
const sizing = (over: Partial<SizingCase> = {}): SizingCase => ({
  format: "ebbmark-case/1",
  kind: "sizing",
  fire,
  cold,
  rangeM: [0.009, 0.02],
  ...over,
});
const timeOf = (bore: number): number =>
  runBlowdown(withBore(fire, bore)).summary.timeToTargetPressureS ?? Number.POSITIVE_INFINITY;
const steelOf = (bore: number): number => runBlowdown(withBore(cold, bore)).summary.minimumWallTemperatureK ?? 0;

describe("the window of bores", () => {
  const result = runSizing(sizing());

  it("has edges that full runs confirm from both sides", () => {
    const { smallest, largest, window } = result;
    expect(window.state).toBe("open");
    expect(Math.abs(timeOf(smallest?.diameterM ?? 0) / 1200 - 1)).toBeLessThan(2e-4);
    expect(timeOf(0.998 * (smallest?.diameterM ?? 0))).toBeGreaterThan(1200);
    expect(Math.abs(steelOf(largest?.diameterM ?? 0) - 247)).toBeLessThan(0.03);
    expect(steelOf(0.99 * (largest?.diameterM ?? 0))).toBeGreaterThan(247);
    expect(steelOf(1.01 * (largest?.diameterM ?? 0))).toBeLessThan(247);
    expect(window.widthM).toBeCloseTo((window.toM ?? 0) - (window.fromM ?? 0), 12);
  });

  it("draws both figures along rising bores, and reads off where the load passes its capacity", () => {
    const bores = result.curve.map(({ diameterM }) => diameterM);
    expect(bores).toEqual([...bores].sort((a, b) => a - b));
    const fast = result.curve.flatMap(({ timeToTargetS }) => timeToTargetS ?? []);
    expect(fast).toEqual([...fast].sort((a, b) => b - a));
    const passed = result.loadPassedAboveM ?? 0;
    expect(runBlowdown(withBore(fire, passed)).summary.peakVentRateKgPerS / 3).toBeCloseTo(1, 2);
  });

  it("looks at the bore of the case besides, with what is in hand", () => {
    const { chosen } = result;
    expect(chosen?.diameterM).toBe(0.02);
    expect(chosen?.timeInHandS).toBeCloseTo(1200 - timeOf(0.02), 1);
    expect(chosen?.steelInHandK).toBeCloseTo(steelOf(0.02) - 247, 1);
  });

  it("gives the same bytes again", () => expect(JSON.stringify(runSizing(sizing()))).toBe(JSON.stringify(result)));

  it("says that there is no window where the edges cross", () => {
    const tight = { ...cold, vessel: { ...cold.vessel, wall: { ...cold.vessel.wall!, minimumDesignMetalTemperatureK: 249 } } };
    const none = runSizing(sizing({ cold: tight }));
    expect(none.window.state).toBe("none");
    expect(none.sentence).toMatch(/No bore works/);
  });

  it("says that there is no upper edge where the steel stays warm", () => {
    const easy = { ...cold, vessel: { ...cold.vessel, wall: { ...cold.vessel.wall!, minimumDesignMetalTemperatureK: 150 } } };
    expect(runSizing(sizing({ cold: easy })).window).toMatchObject({ state: "no-upper-edge" });
  });

  it("takes the warm stretch that the fire can use where slow and fast blowdowns are both warm enough", () => {
    const dip = { ...cold, vessel: { ...cold.vessel, wall: { ...cold.vessel.wall!, minimumDesignMetalTemperatureK: 246 } } };
    const low = runSizing(sizing({ cold: dip, rangeM: [0.008, 0.04] }));
    expect(low.window.state).toBe("open");
    expect(low.largest?.diameterM).toBeLessThan(0.02);
    const faster = { ...fire, limits: { ...fire.limits, targetTimeS: 500 } };
    const high = runSizing(sizing({ cold: dip, fire: faster, rangeM: [0.008, 0.04] }));
    expect(high.window.state).toBe("no-upper-edge");
    expect(high.window.fromM).toBe(high.coldBelow?.diameterM);
    expect(steelOf(1.01 * (high.coldBelow?.diameterM ?? 0))).toBeGreaterThan(246);
  });

  it("finds the smallest bore beyond the jump where a smaller one never reaches the target in the fire", () => {
    const hot = {
      ...fire,
      vessel: { ...fire.vessel, geometry: { shape: "volume", volumeM3: 0.1, innerAreaM2: 1.4 } },
    } as BlowdownCase;
    const jump: BlowdownCase = { ...hot, limits: { targetPressurePa: 4e6, targetTimeS: 300 } };
    const { smallest } = runSizing(sizing({ fire: jump, cold: undefined, rangeM: undefined }));
    const reach = (bore: number) => runBlowdown(withBore(jump, bore), { coarse: true }).summary.timeToTargetPressureS;
    expect(smallest?.value).toBeLessThan(300);
    expect(reach(1.001 * (smallest?.diameterM ?? 0))).toBeLessThan(300);
    expect(reach(0.998 * (smallest?.diameterM ?? 0)) ?? Infinity).toBeGreaterThan(300);
  });

  it("sizes for one case alone", () => {
    expect(runSizing(sizing({ cold: undefined })).window.state).toBe("no-upper-edge");
    expect(runSizing(sizing({ fire: undefined })).largest?.diameterM).toBeCloseTo(result.largest?.diameterM ?? 0, 5);
  });

  it.each<[string, Partial<SizingCase>, string]>([
    ["no target", { fire: { ...fire, limits: {} } }, "fire.limits"],
    [
      "no rating",
      { cold: { ...cold, vessel: { geometry: cold.vessel.geometry, wall: { steel: "carbon_steel", thicknessM: 0.01 } } } },
      "cold.vessel.wall.minimumDesignMetalTemperatureK",
    ],
    [
      "a valve",
      {
        fire: {
          ...fire,
          release: {
            path: "valve",
            cv: 20,
            xt: 0.7,
            from: "vapour",
            backPressurePa: 101325,
            openingTimeS: 0,
            flowModel: "frozen",
          },
        },
      },
      "fire.release.path",
    ],
    [
      "a target above the start",
      { fire: { ...fire, limits: { targetPressurePa: 9e6, targetTimeS: 900 } } },
      "fire.release.targetPressurePa",
    ],
    ["nothing", { fire: undefined, cold: undefined }, "fire"],
  ])("refuses %s and names the field", (_what, over, path) => {
    expect(() => runSizing(sizing(over))).toThrow(expect.objectContaining({ path }) as Error);
  });

  it("stops when it is told to", () => {
    expect(() => runSizing(sizing(), { isCancelled: () => true })).toThrow(
      expect.objectContaining({ code: "cancelled" }) as Error,
    );
  });
});

describe("the state of a window", () => {
  const curve = [{ diameterM: 0.01, minimumWallTemperatureK: 200 }];
  const none = { smallest: undefined, largest: undefined, coldBelow: undefined };
  it("is none where every bore is too cold, and without edges where every bore does", () => {
    expect(windowOf({ ...none, curve, limits: { minimumWallTemperatureK: 244 } }).state).toBe("none");
    expect(windowOf({ ...none, curve, limits: { minimumWallTemperatureK: 190 } }).state).toBe("no-edge");
  });
});

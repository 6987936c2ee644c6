// Several ways out, relief devices that open and shut, tail pipes.
import { describe, expect, it } from "vitest";
import methods from "../../../../tests/fixtures/checks/methods.json";
import { plainCase } from "../../../../tests/fixtures/blowdowns";
import { idealGas } from "../../../../tests/fixtures/fluids";
import { roughFriction } from "../../flow/tail-pipe";
import { inletPressurePa } from "../../disposal/pipe-flow";
import type { BlowdownCase, OrificeRelease } from "../blowdown-case";
import { runBlowdown } from "./run-blowdown";

const relative = (value: number, expected: number) => Math.abs(value / expected - 1);
const air = idealGas(1.4, 0.029);
const base = plainCase(air, { pressurePa: 5e6, stopPressurePa: 5e5, volumeM3: 5, diameterM: 0.02 });
const orifice = base.release as OrificeRelease;

describe("several releases at once", () => {
  it("two bores pass what one of their joint area passes", () => {
    const half = { ...orifice, diameterM: orifice.diameterM / Math.SQRT2 };
    const two = runBlowdown({ ...base, release: half, releases: [half] });
    const one = runBlowdown(base);
    expect(relative(two.summary.endTimeS, one.summary.endTimeS)).toBeLessThan(1e-9);
    expect(relative(two.summary.ventedMassKg, one.summary.ventedMassKg)).toBeLessThan(1e-9);
    expect(two.summary.massClosure).toBeLessThan(1e-9);
  });

  it("open and close by the clock: nothing leaves before, the rate halves after", () => {
    const { series, summary } = runBlowdown({
      ...base,
      release: { ...orifice, opensAtS: 10 },
      releases: [{ ...orifice, opensAtS: 10, closesAtS: 40 }],
    });
    const rateAt = (t: number) => series.ventRateKgPerS[series.timeS.findIndex((time) => time > t)] ?? Number.NaN;
    expect(rateAt(5)).toBe(0);
    expect(series.massKg[0]).toBe(series.massKg[series.timeS.findIndex((time) => time >= 9)]);
    const [before, after] = [rateAt(39), rateAt(40.001)];
    expect(after / before).toBeGreaterThan(0.45);
    expect(after / before).toBeLessThan(0.52);
    expect(summary.massClosureRecounted).toBeLessThan(1e-5);
  });

  it("leave from liquid and vapour of one vessel together", () => {
    const drum: BlowdownCase = {
      ...plainCase({ equation: "peng-robinson-1976", components: [{ id: "propane", moleFraction: 1 }] }, { stopPressurePa: 4e5 }),
      vessel: { geometry: { shape: "volume", volumeM3: 5 } },
      start: { temperatureK: 293.15, liquidVolumeFraction: 0.5 },
    };
    const vapour = { ...orifice, diameterM: 0.02 };
    const liquid = { ...vapour, from: "liquid" as const, flowModel: "equilibrium" as const };
    const both = runBlowdown({ ...drum, release: vapour, releases: [liquid] });
    const only = runBlowdown({ ...drum, release: vapour });
    expect(both.summary.endTimeS).toBeLessThan(0.9 * only.summary.endTimeS);
    expect(both.summary.peakVentRateKgPerS).toBeGreaterThan(3 * only.summary.peakVentRateKgPerS);
    expect(both.summary.energyClosure).toBeLessThan(1e-6);
  });
});

describe("a relief device", () => {
  const relief = {
    path: "relief",
    areaM2: 2e-4,
    dischargeCoefficient: 0.975,
    setPressurePa: 6e6,
    reseatPressurePa: 5.4e6,
    from: "vapour",
    backPressurePa: 101325,
    openingTimeS: 0,
    flowModel: "frozen",
  } as const;
  const heated: BlowdownCase = {
    ...base,
    release: relief,
    heat: { ...base.heat, outside: { model: "constant-heat", heatW: 2e5 } },
    run: { ...base.run, stopTimeS: 300, stopPressurePa: 2e5 },
  };

  it("opens at its set pressure, shuts at its reseating pressure, and never lets the pressure above", () => {
    const { series, summary } = runBlowdown(heated);
    // A closed ideal gas of constant volume: dp/dt = (κ − 1) Q/V; from 50 to 60 bar at 16 kPa/s.
    const firstOpen = series.timeS[series.ventRateKgPerS.findIndex((rate) => rate > 0)] ?? Number.NaN;
    expect(relative(firstOpen, 1e6 / ((0.4 * 2e5) / 5))).toBeLessThan(1e-6);
    expect(Math.max(...series.pressurePa)).toBeLessThan(6e6 * (1 + 1e-9));
    const openings = series.ventRateKgPerS.filter((rate, i) => rate > 0 && series.ventRateKgPerS[i - 1] === 0).length;
    expect(openings).toBeGreaterThan(2);
    const afterFirst = series.pressurePa.slice(series.ventRateKgPerS.findIndex((rate) => rate > 0));
    expect(Math.min(...afterFirst)).toBeGreaterThan(5.4e6 * (1 - 1e-9));
    expect(summary.massClosure).toBeLessThan(1e-9);
    expect(summary.endedBy).toBe("time");
  });

  it("is refused when it would flutter", () => {
    expect(() => runBlowdown({ ...heated, release: { ...relief, reseatPressurePa: 6.1e6 } })).toThrow(
      /between the back pressure/,
    );
  });
});

describe("a tail pipe", () => {
  it("M9-02: inlet pressure of the isothermal form", () => {
    const check = methods.checks.find((row) => row.id === "M9-02");
    expect(check).toBeDefined();
    // 50 000 kg/h, 150 kPa, 0.30 m, 300 K, M 20, L 200 m, f 0.014: 270.40 kPa.
    const { inletPa } = inletPressurePa(
      { massFlowKgPerS: 50000 / 3600, diameterM: 0.3, temperatureK: 300, molarMassKgPerMol: 0.02, compressibility: 1 },
      150e3,
      (0.014 * 200) / 0.3,
    );
    expect(relative(inletPa, 270.4e3)).toBeLessThan(1e-3);
  });

  it("only sets the pressure behind a choked bore, and throttles the flow when it is long and narrow", () => {
    const pipe = { lengthM: 20, diameterM: 0.1, roughnessM: 4.5e-5, lossCoefficient: 2 };
    const free = runBlowdown(base);
    const wide = runBlowdown({ ...base, release: { ...orifice, tailPipe: pipe } });
    expect(relative(wide.summary.endTimeS, free.summary.endTimeS)).toBeLessThan(1e-6);
    const behind = wide.series.backPressurePa ?? [];
    const rate = wide.series.ventRateKgPerS[0] ?? Number.NaN;
    const { inletPa } = inletPressurePa(
      { massFlowKgPerS: rate, diameterM: 0.1, temperatureK: 300, molarMassKgPerMol: 0.029, compressibility: 1 },
      101325,
      (roughFriction(4.5e-5 / 0.1) * 20) / 0.1 + 2,
    );
    expect(relative(behind[0] ?? Number.NaN, inletPa)).toBeLessThan(1e-6);
    const narrow = runBlowdown({ ...base, release: { ...orifice, tailPipe: { ...pipe, diameterM: 0.02, lengthM: 50 } } });
    expect(narrow.summary.endTimeS).toBeGreaterThan(1.5 * free.summary.endTimeS);
    expect(narrow.summary.massClosure).toBeLessThan(1e-9);
    expect(narrow.summary.massClosureRecounted).toBeLessThan(1e-4);
  });
});

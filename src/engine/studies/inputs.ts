/**
 * The inputs of a blowdown that a study varies: what each does to the case, and how far it is usually unsure.
 *
 * `factor` multiplies, `shift` adds kelvins. The bands are first-order ranges of practice (docs/methods/uncertainty.md); a study may state its own.
 */
import type { BlowdownCase, StatePair, VesselGeometry, WallSpec } from "../cases/blowdown-case";
import type { Distribution } from "../cases/study-case";

export const inputIds = [
  "bore",
  "discharge-coefficient",
  "volume",
  "start-pressure",
  "start-temperature",
  "liquid-level",
  "composition",
  "inside-film",
  "wall-thickness",
  "ambient-temperature",
  "outside-film",
  "outside-heat",
] as const;
export type InputId = (typeof inputIds)[number];

export type InputRule = {
  title: string;
  mode: "factor" | "shift";
  unit: "" | "K";
  low: number;
  high: number;
  distribution: Distribution;
  /** The case with the input varied, or undefined where the case has no such input. */
  vary: (blowdown: BlowdownCase, by: number) => BlowdownCase | undefined;
};

const factor = { mode: "factor", unit: "", distribution: "triangular" } as const;
const shift = { mode: "shift", unit: "K", distribution: "triangular" } as const;

export const inputRules: Record<InputId, InputRule> = {
  bore: {
    ...factor,
    title: "Bore, or Cv of a valve",
    low: 0.99,
    high: 1.01,
    vary: (blowdown, by) => {
      const { release } = blowdown;
      if (release.path === "orifice") return { ...blowdown, release: { ...release, diameterM: release.diameterM * by } };
      return release.path === "valve" ? { ...blowdown, release: { ...release, cv: release.cv * by } } : undefined;
    },
  },
  "discharge-coefficient": {
    ...factor,
    title: "Discharge coefficient",
    low: 0.92,
    high: 1.08,
    vary: (blowdown, by) => {
      const { release } = blowdown;
      if (!("dischargeCoefficient" in release)) return undefined;
      return { ...blowdown, release: { ...release, dischargeCoefficient: Math.min(release.dischargeCoefficient * by, 1) } };
    },
  },
  volume: { ...factor, title: "Volume", low: 0.95, high: 1.05, vary: withVolume },
  "start-pressure": {
    ...factor,
    title: "Pressure at the start",
    low: 0.98,
    high: 1.02,
    vary: (blowdown, by) =>
      withStart(blowdown, (pair) => ("pressurePa" in pair ? { ...pair, pressurePa: pair.pressurePa * by } : undefined)),
  },
  "start-temperature": {
    ...shift,
    title: "Temperature at the start",
    low: -5,
    high: 5,
    vary: (blowdown, by) =>
      withStart(blowdown, (pair) => ("temperatureK" in pair ? { ...pair, temperatureK: pair.temperatureK + by } : undefined)),
  },
  "liquid-level": {
    ...factor,
    title: "Liquid part of the volume",
    low: 0.9,
    high: 1.1,
    vary: (blowdown, by) =>
      withStart(blowdown, (pair) =>
        "liquidVolumeFraction" in pair
          ? { ...pair, liquidVolumeFraction: Math.min(pair.liquidVolumeFraction * by, 1) }
          : undefined,
      ),
  },
  composition: {
    ...factor,
    title: "Amounts of all components but the main one",
    low: 0.9,
    high: 1.1,
    vary: withComposition,
  },
  "inside-film": {
    ...factor,
    title: "Film inside",
    distribution: "lognormal",
    low: 0.5,
    high: 2,
    vary: (blowdown, by) => {
      const { inside } = blowdown.heat;
      if (inside.model === "none") return undefined;
      if (inside.model === "correlations")
        return { ...blowdown, heat: { ...blowdown.heat, inside: { ...inside, factor: (inside.factor ?? 1) * by } } };
      const coefficientWPerM2K = inside.coefficientWPerM2K * by;
      return { ...blowdown, heat: { ...blowdown.heat, inside: { ...inside, coefficientWPerM2K } } };
    },
  },
  "wall-thickness": {
    ...factor,
    title: "Thickness of the wall, and its mass",
    low: 0.875,
    high: 1,
    vary: (blowdown, by) => (blowdown.heat.wall.model === "none" ? undefined : withWall(blowdown, (wall) => thinner(wall, by))),
  },
  "ambient-temperature": {
    ...shift,
    title: "Temperature of the surroundings",
    low: -5,
    high: 5,
    vary: (blowdown, by) => {
      const { outside } = blowdown.heat;
      if (outside.model !== "ambient") return undefined;
      return { ...blowdown, heat: { ...blowdown.heat, outside: { ...outside, temperatureK: outside.temperatureK + by } } };
    },
  },
  "outside-film": {
    ...factor,
    title: "Film outside",
    distribution: "lognormal",
    low: 0.5,
    high: 2,
    vary: (blowdown, by) => {
      const { outside } = blowdown.heat;
      if (outside.model !== "ambient") return undefined;
      const coefficientWPerM2K = outside.coefficientWPerM2K * by;
      return { ...blowdown, heat: { ...blowdown.heat, outside: { ...outside, coefficientWPerM2K } } };
    },
  },
  "outside-heat": {
    ...factor,
    title: "Heat of the fire, or stated for the outside",
    low: 0.7,
    high: 1.3,
    vary: (blowdown, by) => {
      const { outside } = blowdown.heat;
      if (outside.model === "constant-heat" && outside.heatW !== 0)
        return { ...blowdown, heat: { ...blowdown.heat, outside: { ...outside, heatW: outside.heatW * by } } };
      if (outside.model === "surface-fire" || outside.model === "pool-fire")
        return { ...blowdown, heat: { ...blowdown.heat, outside: { ...outside, factor: (outside.factor ?? 1) * by } } };
      return undefined;
    },
  },
};

/** Nought of a shift, one of a factor: the input as the case has it. */
export const unvaried = (input: InputId): number => (inputRules[input].mode === "factor" ? 1 : 0);

/** Inputs that the case has, in the order of the table. */
export const inputsOf = (blowdown: BlowdownCase): InputId[] =>
  inputIds.filter((input) => inputRules[input].vary(blowdown, unvaried(input)) !== undefined);

function withStart(blowdown: BlowdownCase, change: (pair: StatePair) => StatePair | undefined): BlowdownCase | undefined {
  const { start, vessels } = blowdown;
  if (!("settleOut" in start)) {
    const { restAtTemperatureK, ...pair } = start;
    const changed = change(pair as StatePair); // without its rest a start is one of the pairs
    return changed && { ...blowdown, start: restAtTemperatureK === undefined ? changed : { ...changed, restAtTemperatureK } };
  }
  const changed = (vessels ?? []).map((part) => change(part.start));
  if (changed.length === 0 || !changed.every((pair) => pair !== undefined)) return undefined;
  return { ...blowdown, vessels: vessels?.map((part, i) => ({ ...part, start: changed[i] ?? part.start })) ?? [] };
}

function withVolume(blowdown: BlowdownCase, by: number): BlowdownCase {
  const grown = { ...blowdown, vessel: { ...blowdown.vessel, geometry: scaled(blowdown.vessel.geometry, by) } };
  if (!blowdown.vessels) return grown;
  const vessels = blowdown.vessels.map((part) => ({ ...part, geometry: scaled(part.geometry, by) }));
  return { ...grown, vessels };
}

/** Every length by the cube root; a pipe by its length alone. */
function scaled(geometry: VesselGeometry, by: number): VesselGeometry {
  const length = Math.cbrt(by);
  switch (geometry.shape) {
    case "volume":
      return {
        ...geometry,
        volumeM3: geometry.volumeM3 * by,
        ...(geometry.innerAreaM2 === undefined ? {} : { innerAreaM2: geometry.innerAreaM2 * length ** 2 }),
      };
    case "cylinder":
      return {
        ...geometry,
        insideDiameterM: geometry.insideDiameterM * length,
        tangentLengthM: geometry.tangentLengthM * length,
      };
    case "sphere":
      return { ...geometry, insideDiameterM: geometry.insideDiameterM * length };
    case "pipe":
      return { ...geometry, lengthM: geometry.lengthM * by };
    case "section":
      return { ...geometry, parts: geometry.parts.map((part) => scaled(part, by)) };
  }
}

function withComposition(blowdown: BlowdownCase, by: number): BlowdownCase | undefined {
  const { components } = blowdown.fluid;
  const most = components.reduce((best, one, i) => (one.moleFraction > (components[best]?.moleFraction ?? 0) ? i : best), 0);
  const others = components.reduce((sum, one, i) => (i === most ? sum : sum + one.moleFraction), 0);
  if (others === 0 || others * by >= 1) return undefined;
  const varied = components.map((one, i) => ({ ...one, moleFraction: i === most ? 1 - others * by : one.moleFraction * by }));
  return { ...blowdown, fluid: { ...blowdown.fluid, components: varied } };
}

function withWall(blowdown: BlowdownCase, change: (wall: WallSpec) => WallSpec): BlowdownCase | undefined {
  const { vessel, vessels } = blowdown;
  if (!vessel.wall) return undefined;
  const changed = { ...blowdown, vessel: { ...vessel, wall: change(vessel.wall) } };
  if (!vessels) return changed;
  return { ...changed, vessels: vessels.map((part) => (part.wall ? { ...part, wall: change(part.wall) } : part)) };
}

const thinner = (wall: WallSpec, by: number): WallSpec => ({
  ...wall,
  thicknessM: wall.thicknessM * by,
  ...(wall.massKg === undefined ? {} : { massKg: wall.massKg * by }),
});

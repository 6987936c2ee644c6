/** What a vessel is and what it starts from, as schemas: shapes, wall, states, and the vessels that are joined into a section. */
import { z } from "zod";
import type { StartSpec, StatePair } from "@/engine/cases/blowdown-case";
import { steelIds } from "@/engine/steels/steel";
import { headShapes } from "@/engine/vessel/head";
import { choice, fraction, pressure, quantity, sumToOne, temperature, text } from "./case-fields";

const pairWords =
  "Give exactly two of pressurePa, temperatureK and liquidVolumeFraction, or, for several vessels, settleOut alone.";
const countOf = (pair: object): number => Object.values(pair).filter((value) => value !== undefined).length;

export const diameter = quantity({ unit: "m", above: 0, max: 100 });
const shapes = [
  z.strictObject({
    shape: z.literal("volume"),
    volumeM3: quantity({ unit: "m³", above: 0, max: 1e6 }),
    innerAreaM2: quantity({ unit: "m²", above: 0, max: 1e7 }).optional(),
  }),
  z.strictObject({
    shape: z.literal("cylinder"),
    orientation: choice(["vertical", "horizontal"]),
    insideDiameterM: diameter,
    tangentLengthM: quantity({ unit: "m", min: 0, max: 1e4 }),
    heads: choice(headShapes),
  }),
  z.strictObject({ shape: z.literal("sphere"), insideDiameterM: diameter }),
  z.strictObject({ shape: z.literal("pipe"), insideDiameterM: diameter, lengthM: quantity({ unit: "m", above: 0, max: 1e6 }) }),
] as const;
const oneVessel = z.discriminatedUnion("shape", shapes, { error: 'Use one of "volume", "cylinder", "sphere", "pipe".' });
export const geometry = z.discriminatedUnion(
  "shape",
  [
    ...shapes,
    z.strictObject({ shape: z.literal("section"), parts: z.array(oneVessel).min(1, "Give at least one part.").max(50) }),
  ],
  { error: 'Use one of "volume", "cylinder", "sphere", "pipe", "section".' },
);

export const wall = z.strictObject({
  steel: choice(steelIds),
  thicknessM: quantity({ unit: "m", above: 0, max: 2 }),
  massKg: quantity({ unit: "kg", above: 0, max: 1e9 }).optional(),
  specificHeatJPerKgK: quantity({ unit: "J/(kg K)", above: 0, max: 1e5 }).optional(),
  designPressurePa: pressure.optional(),
  minimumDesignMetalTemperatureK: temperature.optional(),
  insulation: z
    .strictObject({
      thicknessM: quantity({ unit: "m", above: 0, max: 5 }),
      conductivityWPerMK: quantity({ unit: "W/(m K)", above: 0, max: 1e3 }),
    })
    .optional(),
  fireProofing: z
    .strictObject({
      thicknessM: quantity({ unit: "m", above: 0, max: 5 }),
      conductivityWPerMK: quantity({ unit: "W/(m K)", above: 0, max: 1e3 }),
    })
    .optional(),
});

export const statePair = z
  .strictObject({
    pressurePa: pressure.optional(),
    temperatureK: temperature.optional(),
    liquidVolumeFraction: fraction.optional(),
  })
  .refine((pair) => countOf(pair) === 2, { error: pairWords })
  .transform((given) => given as StatePair); // the refinement above leaves exactly two

export const start = z
  .strictObject({
    pressurePa: pressure.optional(),
    temperatureK: temperature.optional(),
    liquidVolumeFraction: fraction.optional(),
    settleOut: choice(["adiabatic", "with-steel"]).optional(),
    restAtTemperatureK: temperature.optional(),
  })
  .refine(({ settleOut, restAtTemperatureK: _rest, ...pair }) => countOf(pair) === (settleOut ? 0 : 2), { error: pairWords })
  .transform((given) => given as StartSpec); // the refinement above leaves exactly two, or the way of settling

export const sectionPart = z.strictObject({
  name: text(60).optional(),
  geometry: oneVessel,
  wall: wall.optional(),
  start: statePair,
  components: z
    .array(z.strictObject({ id: text(60), moleFraction: fraction }))
    .min(1, "There is no component. Give at least one, or leave the list out.")
    .superRefine(sumToOne)
    .optional(),
  wallTemperatureK: temperature.optional(),
});

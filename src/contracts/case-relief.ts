/** A relief scenario as a schema. */
import { z } from "zod";
import type { FluidSpec } from "@/engine/cases/fluid-spec";
import type { OrificeLetter } from "@/engine/relief/orifices";
import { standardOrifices } from "@/engine/relief/orifices";
import { choice, pressure, quantity, temperature, text } from "./case-fields";
import { diameter } from "./case-vessel";

const gauge = quantity({ unit: "Pa gauge", above: 0, max: 1e9 });
const area = quantity({ unit: "m²", above: 0, max: 1e5 });
const heat = quantity({ unit: "W", above: 0, max: 1e12 });
const coefficient = quantity({ unit: "", above: 0, max: 1 });
const feed = z.strictObject({ pressurePa: pressure, temperatureK: temperature });
const letters = standardOrifices.map(({ letter }) => letter) as [OrificeLetter, ...OrificeLetter[]];

const device = z.strictObject({
  type: choice(["conventional", "balanced", "pilot"]).default("conventional"),
  setPressureGaugePa: gauge,
  workingPressureGaugePa: gauge.optional(),
  count: quantity({ unit: "", min: 1, max: 20 })
    .refine(Number.isInteger, { error: "Give a whole number of devices." })
    .default(1),
  ruptureDisk: z.boolean({ error: "Give true or false." }).default(false),
  orifice: choice(letters).optional(),
});

const through = z.discriminatedUnion(
  "path",
  [
    z.strictObject({ path: z.literal("orifice"), diameterM: diameter, dischargeCoefficient: coefficient }),
    z.strictObject({ path: z.literal("valve"), cv: quantity({ unit: "", above: 0, max: 1e6 }), xt: coefficient }),
  ],
  { error: 'Use one of "orifice", "valve".' },
);

const passage = {
  upstream: feed,
  through,
  leavesKgPerS: quantity({ unit: "kg/s", min: 0, max: 1e5 }).default(0),
};
const scenarios = z.discriminatedUnion(
  "scenario",
  [
    z.strictObject({
      scenario: z.literal("fire-wetted"),
      wettedAreaM2: area,
      drainage: choice(["adequate", "inadequate"]),
      environmentFactor: coefficient.default(1),
    }),
    z.strictObject({
      scenario: z.literal("fire-unwetted"),
      exposedAreaM2: area,
      wallTemperatureK: temperature.default(866),
      normal: feed,
    }),
    z.strictObject({
      scenario: z.literal("blocked-outlet"),
      massFlowKgPerS: quantity({ unit: "kg/s", above: 0, max: 1e5 }),
      temperatureK: temperature,
    }),
    z.strictObject({ scenario: z.literal("gas-blow-by"), ...passage }),
    z.strictObject({ scenario: z.literal("valve-failure"), ...passage }),
    z.strictObject({
      scenario: z.literal("tube-rupture"),
      upstream: feed,
      tubeInsideDiameterM: diameter,
      dischargeCoefficient: coefficient.default(0.7),
    }),
    z.strictObject({ scenario: z.literal("thermal-expansion"), heatW: heat, temperatureK: temperature }),
    z.strictObject({
      scenario: z.literal("ambient-heating"),
      projectedAreaM2: area,
      fluxWPerM2: quantity({ unit: "W/m²", above: 0, max: 2000 }).default(1000),
      absorptivity: coefficient.default(1),
      temperatureK: temperature,
    }),
    z.strictObject({ scenario: z.literal("heat-load"), heatW: heat }),
  ],
  {
    error:
      'Use one of "fire-wetted", "fire-unwetted", "blocked-outlet", "gas-blow-by", "valve-failure", "tube-rupture", "thermal-expansion", "ambient-heating", "heat-load".',
  },
);

export const reliefCase = (fluid: z.ZodType<FluidSpec>) =>
  z
    .strictObject({
      format: z.literal("ebbmark-case/1", { error: 'Give "format": "ebbmark-case/1".' }),
      title: text(200).optional(),
      kind: z.literal("relief"),
      fluid,
      device,
      relief: scenarios,
      backPressurePa: pressure.default(101325),
      superimposedPa: pressure.default(101325),
      inlet: z.strictObject({ diameterM: diameter, resistanceCoefficient: quantity({ unit: "", min: 0, max: 1000 }) }).optional(),
    })
    .refine(({ superimposedPa, backPressurePa }) => superimposedPa <= backPressurePa, {
      error: "This is part of the total back pressure, so it must not be above it.",
      path: ["superimposedPa"],
    });

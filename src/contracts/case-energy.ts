/** A vessel's held energy as a schema. */
import { z } from "zod";
import { energyDefinitions } from "@/engine/cases/energy-case";
import { tntJPerKg } from "@/engine/energy/pressure-test";
import type { FluidSpec } from "@/engine/cases/fluid-spec";
import { choice, describe, pressure, quantity, text } from "./case-fields";
import { geometry, statePair } from "./case-vessel";

export const energyCase = (fluid: z.ZodType<FluidSpec>) =>
  z.strictObject({
    format: z.literal("ebbmark-case/1", { error: 'Give "format": "ebbmark-case/1".' }),
    title: text(200).optional(),
    kind: z.literal("energy"),
    fluid,
    vessel: z.strictObject({ geometry }),
    start: statePair,
    surroundingsPa: pressure.default(101325),
    standOffBy: choice(energyDefinitions).default("isentropic-real"),
    blastFraction: quantity({ unit: "", above: 0, max: 1 }).default(1),
    tntEnergyJPerKg: quantity({ unit: "J/kg", min: 4e6, max: 5e6 }).default(tntJPerKg),
    overpressuresPa: z
      .array(quantity({ unit: "Pa", min: 300, max: 1e6 }), {
        error: ({ input }) => `${describe(input)} Give a list of overpressures in Pa.`,
      })
      .max(20, "There are more than 20 overpressures. Leave some out.")
      .default([2070, 6900, 20700]),
  });

/**
 * The case document as a schema: what a form, the API, a file or the log may hand to the engine.
 *
 * Unknown keys are refused. Defaults are written out, so that the hash of a case covers them. Values that are valid but not computed yet
 * pass here and are refused by the engine.
 */
import { z } from "zod";
import type { BlowdownCase } from "@/engine/cases/blowdown-case";
import { equationIds, volumeTranslations } from "@/engine/cases/fluid-spec";
import type { NozzleCase } from "@/engine/cases/nozzle-case";
import { steelIds } from "@/engine/steels/steel";
import { choice, describe, fraction, pressure, quantity, sumToOne, temperature, text } from "./case-fields";
import { energyCase } from "./case-energy";
import { reliefCase } from "./case-relief";
import { sizingCase, studyCase } from "./case-studies";
import { diameter, geometry, sectionPart, start, wall } from "./case-vessel";
import { readJsonText } from "./json-text";
import { withVesselsJoined } from "./joined-vessels";

export type CaseProblem = { path: string; message: string };

const custom = z.strictObject({
  molarMassKgPerMol: quantity({ unit: "kg/mol", above: 0, max: 10 }),
  criticalTemperatureK: quantity({ unit: "K", above: 0, max: 3000 }),
  criticalPressurePa: quantity({ unit: "Pa", above: 0, max: 1e9 }),
  acentricFactor: quantity({ unit: "", min: -1, max: 3 }),
  idealGasHeatCapacityOverR: z.strictObject({
    polynomial: z
      .array(quantity({ unit: "" }))
      .min(1, "Give 1 to 8 coefficients a0, a1, …")
      .max(8, "Give 1 to 8 coefficients a0, a1, …"),
    rangeK: z
      .tuple([temperature, temperature])
      .refine(([low, high]) => low < high, { error: "The range must rise: give the lower temperature first." }),
  }),
});

const pseudo = z.strictObject({
  molarMassKgPerMol: quantity({ unit: "kg/mol", above: 0, max: 2 }),
  relativeDensity: quantity({ unit: "", min: 0.1, max: 2 }),
});

const plus = z.strictObject({
  molarMassKgPerMol: quantity({ unit: "kg/mol", above: 0, max: 2 }),
  relativeDensity: quantity({ unit: "", min: 0.1, max: 2 }),
  pieces: quantity({ unit: "", min: 1, max: 8 })
    .refine(Number.isInteger, { error: "Give a whole number from 1 to 8." })
    .optional(),
  lightestMolarMassKgPerMol: quantity({ unit: "kg/mol", above: 0.05, max: 1 }).optional(),
});

const component = z
  .strictObject({
    id: text(60).refine((id) => id.length > 0, { error: "This is empty. Give the component's id." }),
    moleFraction: fraction,
    plus: plus.optional(),
    pseudo: pseudo.optional(),
    custom: custom.optional(),
  })
  .refine((one) => [one.plus, one.pseudo, one.custom].filter(Boolean).length <= 1, {
    error: "A component is a plus fraction, a pseudo-component or has its own constants. Keep one of the three.",
    path: ["custom"],
  });

const interaction = z.union(
  [
    z.enum(["library", "none"]),
    z.array(z.strictObject({ pair: z.tuple([text(60), text(60)]), kij: quantity({ unit: "", above: -1, below: 1 }) })),
  ],
  { error: 'Use "library", "none" or a list of { "pair": [id, id], "kij": number } with kij between -1 and 1.' },
);

const fluid = z.strictObject({
  components: z
    .array(component, { error: ({ input }) => `${describe(input)} Give a list of components.` })
    .min(1, "There is no component. Give at least one.")
    .max(50, "There are more than 50 components. Lump the smallest.")
    .superRefine(sumToOne),
  equation: choice(equationIds),
  interaction: interaction.default("library"),
  volumeTranslation: choice(volumeTranslations).optional(),
});

const head = { format: z.literal("ebbmark-case/1", { error: 'Give "format": "ebbmark-case/1".' }), title: text(200).optional() };
const point = z.strictObject({ temperatureK: temperature, pressurePa: pressure });

export const pathCaseSchema = z.strictObject({ ...head, kind: z.literal("path"), fluid, from: point, to: point });

const molar = quantity({ unit: "J/mol", min: -1e9, max: 1e9 });
const entropy = quantity({ unit: "J/(mol K)", min: -1e6, max: 1e6 });
const flashHead = { ...head, kind: z.literal("flash"), fluid };
export const flashCaseSchema = z.discriminatedUnion(
  "specification",
  [
    z.strictObject({ ...flashHead, specification: z.literal("PT"), pressurePa: pressure, temperatureK: temperature }),
    z.strictObject({ ...flashHead, specification: z.literal("PH"), pressurePa: pressure, enthalpyJPerMol: molar }),
    z.strictObject({ ...flashHead, specification: z.literal("PS"), pressurePa: pressure, entropyJPerMolK: entropy }),
    z.strictObject({
      ...flashHead,
      specification: z.literal("UV"),
      internalEnergyJPerMol: molar,
      molarVolumeM3PerMol: quantity({ unit: "m³/mol", above: 0, max: 1e3 }),
    }),
    z.strictObject({ ...flashHead, specification: z.literal("TQ"), temperatureK: temperature, vapourMoleFraction: fraction }),
    z.strictObject({ ...flashHead, specification: z.literal("PQ"), pressurePa: pressure, vapourMoleFraction: fraction }),
  ],
  { error: 'Use one of "PT", "PH", "PS", "UV", "TQ", "PQ".' },
);

const stagnation = z
  .strictObject({ pressurePa: pressure, temperatureK: temperature.optional(), vapourMoleFraction: fraction.optional() })
  .refine((state) => (state.temperatureK === undefined) !== (state.vapourMoleFraction === undefined), {
    error: "Give temperatureK, or vapourMoleFraction of a saturated state, and not both.",
  })
  .transform((state) => state as NozzleCase["stagnation"]); // the refinement above leaves exactly one of the two

export const nozzleCaseSchema = z.strictObject({
  ...head,
  kind: z.literal("nozzle"),
  fluid,
  stagnation,
  backPressurePa: pressure,
  flowModel: choice(["frozen", "equilibrium"]),
});

const outlet = {
  from: choice(["vapour", "liquid", "whole"]).default("vapour"),
  backPressurePa: pressure.default(101325),
  openingTimeS: quantity({ unit: "s", min: 0, max: 1e6 }).default(0),
  flowModel: choice(["frozen", "equilibrium"]).default("frozen"),
  opensAtS: quantity({ unit: "s", min: 0, max: 1e7 }).optional(),
  closesAtS: quantity({ unit: "s", above: 0, max: 1e8 }).optional(),
  tailPipe: z
    .strictObject({
      lengthM: quantity({ unit: "m", min: 0, max: 1e4 }),
      diameterM: quantity({ unit: "m", above: 0, max: 10 }),
      roughnessM: quantity({ unit: "m", above: 0, max: 0.01 }).default(4.5e-5),
      lossCoefficient: quantity({ unit: "", min: 0, max: 1e4 }).default(0),
    })
    .optional(),
};
const dischargeCoefficient = quantity({ unit: "", above: 0, max: 1 });
const openings = [
  z.strictObject({
    path: z.literal("orifice"),
    diameterM: quantity({ unit: "m", above: 0, max: 10 }),
    dischargeCoefficient,
    ...outlet,
  }),
  z.strictObject({
    path: z.literal("valve"),
    cv: quantity({ unit: "", above: 0, max: 1e6 }),
    xt: quantity({ unit: "", above: 0, max: 1 }),
    ...outlet,
  }),
  z.strictObject({
    path: z.literal("relief"),
    areaM2: quantity({ unit: "m²", above: 0, max: 10 }),
    setPressurePa: pressure,
    reseatPressurePa: pressure,
    dischargeCoefficient,
    ...outlet,
  }),
] as const;
const release = z.discriminatedUnion(
  "path",
  [
    ...openings,
    z.strictObject({
      path: z.literal("sized"),
      targetPressurePa: pressure,
      targetTimeS: quantity({ unit: "s", above: 0, max: 1e7 }),
      dischargeCoefficient,
      ...outlet,
    }),
  ],
  { error: 'Use one of "orifice", "valve", "sized", "relief".' },
);

const furtherReleases = z
  .array(z.discriminatedUnion("path", [...openings], { error: 'Use one of "orifice", "valve", "relief".' }))
  .min(1, "There is no further release. Add one, or leave the key out.")
  .max(8, "There are more than 8 further releases. Join the smallest.");

const coefficient = quantity({ unit: "W/(m² K)", min: 0, max: 1e6 });
/** Multiplies what a correlation or a fire law gives. */
const doubt = quantity({ unit: "", min: 0.1, max: 10 });
const none = z.strictObject({ model: z.literal("none") });
const inside = z.discriminatedUnion(
  "model",
  [
    none,
    z.strictObject({ model: z.literal("constant"), coefficientWPerM2K: coefficient }),
    z.strictObject({ model: z.literal("correlations"), factor: doubt.optional() }),
  ],
  { error: 'Use one of "none", "constant", "correlations".' },
);
const wallModel = z.discriminatedUnion(
  "model",
  [none, z.strictObject({ model: z.literal("lumped") }), z.strictObject({ model: z.literal("conduction") })],
  {
    error: 'Use one of "none", "lumped", "conduction".',
  },
);
const outside = z.discriminatedUnion(
  "model",
  [
    z.strictObject({ model: z.literal("adiabatic") }),
    z.strictObject({ model: z.literal("constant-heat"), heatW: quantity({ unit: "W", min: -1e10, max: 1e10 }) }),
    z.strictObject({ model: z.literal("ambient"), temperatureK: temperature, coefficientWPerM2K: coefficient }),
    z.strictObject({
      model: z.literal("pool-fire"),
      bottomAboveGroundM: quantity({ unit: "m", min: 0, max: 200 }).optional(),
      drainage: choice(["adequate", "inadequate"]),
      environmentFactor: quantity({ unit: "", above: 0, max: 1 }),
      factor: doubt.optional(),
    }),
    z.strictObject({
      model: z.literal("surface-fire"),
      basis: choice(["open-pool", "confined-pool", "jet"]),
      heatFluxWPerM2: quantity({ unit: "W/m²", above: 0, max: 1e6 }).optional(),
      factor: doubt.optional(),
    }),
  ],
  { error: 'Use one of "adiabatic", "constant-heat", "ambient", "pool-fire", "surface-fire".' },
);

const limits = z.strictObject({
  targetPressurePa: pressure.optional(),
  targetTimeS: quantity({ unit: "s", above: 0, max: 1e7 }).optional(),
  minimumMetalMarginK: quantity({ unit: "K", min: 0, max: 500 }).optional(),
  ventCapacityKgPerS: quantity({ unit: "kg/s", above: 0, max: 1e6 }).optional(),
  minimumOutletTemperatureK: temperature.optional(),
  waterPresent: z.boolean({ error: ({ input }) => `${describe(input)} Give true or false.` }).optional(),
  nearBandK: quantity({ unit: "K", min: 10, max: 500 }).optional(),
  nearBandFraction: quantity({ unit: "", min: 0.1, max: 1 }).optional(),
});

const fireBasis = choice(["open-pool", "confined-pool", "jet"]);
const afterwards = z.strictObject({ ambientTemperatureK: temperature.optional(), coefficientWPerM2K: coefficient.optional() });
const steelInFire = z.strictObject({
  basis: fireBasis.optional(),
  heatFluxWPerM2: quantity({ unit: "W/m²", above: 0, max: 1e6 }).optional(),
  strengthFraction: quantity({ unit: "", above: 0, max: 1 }).optional(),
  tensileStrengthPa: quantity({ unit: "Pa", above: 1e7, max: 3e9 }).optional(),
  lateByS: z
    .array(quantity({ unit: "s", min: 0, max: 1e5 }))
    .max(8, "There are more than 8 delays. Keep the ones that matter.")
    .optional(),
  items: z
    .array(
      z.strictObject({
        name: text(60),
        steel: choice(steelIds),
        insideDiameterM: diameter,
        thicknessM: quantity({ unit: "m", above: 0, max: 2 }),
      }),
    )
    .max(50)
    .optional(),
});

const vessel = z.strictObject({ geometry, wall: wall.optional() });

export const blowdownCaseSchema = z
  .strictObject({
    ...head,
    kind: z.literal("blowdown"),
    fluid,
    vessel: vessel.optional(),
    vessels: z.array(sectionPart).min(1, "Give at least one vessel.").max(50, "There are more than 50 vessels.").optional(),
    start: start.optional(),
    release,
    releases: furtherReleases.optional(),
    heat: z
      .strictObject({
        inside: inside.default({ model: "none" }),
        wall: wallModel.default({ model: "none" }),
        outside: outside.default({ model: "adiabatic" }),
      })
      .default({ inside: { model: "none" }, wall: { model: "none" }, outside: { model: "adiabatic" } }),
    zones: choice(["equilibrium", "separate"]).optional(),
    zoneExchange: z
      .strictObject({
        coefficientWPerM2K: quantity({ unit: "W/(m² K)", min: 0, max: 1e6 }).optional(),
        relaxationTimeS: quantity({ unit: "s", min: 0.01, max: 1e4 }).optional(),
      })
      .optional(),
    run: z.strictObject({
      stopTimeS: quantity({ unit: "s", above: 0, max: 1e8 }),
      stopPressurePa: pressure,
      relativeTolerance: quantity({ unit: "", min: 1e-9, max: 1e-3 }).default(1e-6),
    }),
    limits: limits.optional(),
    afterwards: afterwards.optional(),
    steelInFire: steelInFire.optional(),
  })
  .transform((given, context): BlowdownCase => {
    const { document, problems } = withVesselsJoined(given);
    for (const { path, message } of problems) context.addIssue({ code: "custom", path, message });
    return document ?? z.NEVER;
  })
  .superRefine((document, context) => {
    for (const { path, message } of blowdownContradictions(document)) context.addIssue({ code: "custom", path, message });
  });

/** The inputs are checked against the method's own fields when it is run. */
export const methodCaseSchema = z.strictObject({
  ...head,
  kind: z.literal("method"),
  method: text(80),
  inputs: z.record(z.string(), z.json(), { error: 'Give an object of inputs, such as { "massFlowKgPerS": 2 }.' }).default({}),
});

export const caseFileSchema = z.discriminatedUnion(
  "kind",
  [
    pathCaseSchema,
    flashCaseSchema,
    nozzleCaseSchema,
    blowdownCaseSchema,
    reliefCase(fluid),
    energyCase(fluid),
    methodCaseSchema,
    sizingCase(blowdownCaseSchema),
    studyCase(blowdownCaseSchema),
  ],
  {
    error: ({ input }) =>
      isObject(input)
        ? 'Use one of "path", "flash", "nozzle", "blowdown", "relief", "energy", "method", "sizing", "study".'
        : "Give one case document, a JSON object.",
  },
);

export type CaseFile = z.output<typeof caseFileSchema>;

/** What no single field can know. Paths into the document, in order. */
function blowdownContradictions({
  vessel,
  start: from,
  release: out,
  heat,
  run,
}: BlowdownCase): { path: string[]; message: string }[] {
  const found: { path: string[]; message: string }[] = [];
  const walled = heat.wall.model !== "none";
  const bare = vessel.geometry.shape === "volume" && vessel.geometry.innerAreaM2 === undefined;
  const needsArea =
    (walled && (heat.inside.model !== "none" || vessel.wall?.massKg === undefined)) ||
    heat.outside.model === "ambient" ||
    heat.outside.model === "surface-fire";
  if (walled && !vessel.wall)
    found.push({
      path: ["vessel", "wall"],
      message: `This is missing. A wall that is "${heat.wall.model}" needs its steel and thickness.`,
    });
  if (!walled && heat.inside.model !== "none")
    found.push({
      path: ["heat", "inside", "model"],
      message: 'There is no wall for the film to touch. Set heat.wall, or the inside to "none".',
    });
  if (bare && needsArea)
    found.push({
      path: ["vessel", "geometry", "innerAreaM2"],
      message: "This is missing. Heat passes through the inside of the vessel, so give its area in m².",
    });
  if ("pressurePa" in from && out.backPressurePa >= from.pressurePa) {
    found.push({
      path: ["release", "backPressurePa"],
      message: `The back pressure must be below the pressure at start, ${from.pressurePa} Pa, or nothing leaves.`,
    });
  }
  if ("pressurePa" in from && run.stopPressurePa >= from.pressurePa) {
    found.push({
      path: ["run", "stopPressurePa"],
      message: `The run must end below the pressure at start, ${from.pressurePa} Pa.`,
    });
  }
  return found;
}

export type ParsedCase = { ok: true; document: CaseFile } | { ok: false; problems: CaseProblem[] };

/** Checks a document that is already an object. The answer holds every default. */
export function parseCase(document: unknown): ParsedCase {
  const parsed = caseFileSchema.safeParse(document, { reportInput: true });
  if (parsed.success) return { ok: true, document: parsed.data };
  return { ok: false, problems: parsed.error.issues.flatMap(problemsOfIssue) };
}

/** Checks a document as text; a key that stands twice is refused. */
export function parseCaseText(jsonText: string): ParsedCase {
  const read = readJsonText(jsonText);
  return read.ok ? parseCase(read.value) : { ok: false, problems: [{ path: read.path, message: read.message }] };
}

function problemsOfIssue(issue: z.core.$ZodIssue): CaseProblem[] {
  const path = pathText(issue.path);
  if (issue.code === "unrecognized_keys") {
    return issue.keys.map((key) => ({
      path: pathText([...issue.path, key]),
      message: `"${key}" is not a key of the case format here. Check its spelling, or remove it.`,
    }));
  }
  if (issue.code === "invalid_type" && issue.message.startsWith("Invalid input")) {
    return [
      { path, message: `${describe(issue.input)} Give ${issue.expected === "object" ? "an object" : `a ${issue.expected}`}.` },
    ];
  }
  return [{ path, message: issue.message }];
}

/** `fluid.components[1].moleFraction` */
function pathText(path: readonly PropertyKey[]): string {
  return path.reduce<string>(
    (before, part) =>
      typeof part === "number" ? `${before}[${part}]` : before === "" ? String(part) : `${before}.${String(part)}`,
    "",
  );
}

const isObject = (value: unknown): boolean => typeof value === "object" && value !== null && !Array.isArray(value);

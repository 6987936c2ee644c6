import { describe, expect, it } from "vitest";
import type { BlowdownCase } from "@/engine/cases/blowdown-case";
import { runBlowdown } from "@/engine/cases/blowdown/run-blowdown";
import { parseCase } from "./case-file";
import { newDraft, type DraftDocument } from "./draft";
import { lineKeyOfPath } from "./draft-back-links";
import { caseFromDraft, type SiteFacts } from "./draft-to-case";
import { lines } from "./lines/registry";
import type { ChoiceLine, LineKey } from "./lines/line";
import { defaultPolicy } from "./policy";

const site: SiteFacts = { barometricPressurePa: 101325, policy: defaultPolicy };
const source = { kind: "sheet", note: "DS-1" } as const;

/** Words for choices, figures in SI. */
type Lines = Record<LineKey, string | number>;

function draftOf(given: Lines, components: [string, number][] = [["propane", 100]]): DraftDocument {
  const draft = newDraft("Every choice");
  for (const [key, value] of Object.entries(given)) {
    draft.lines[key] =
      typeof value === "string"
        ? { typed: value, unit: null, si: null, source: null }
        : { typed: String(value), unit: null, si: value, source };
  }
  draft.composition = {
    rows: components.map(([id, percent]) => ({ id, typed: String(percent), molePercent: percent })),
    normalised: false,
    source,
  };
  return draft;
}

const drum: Lines = {
  "2.01-1": "D-1",
  "2.04-1": 1.6,
  "2.05-1": 4,
  "2.08": "temperature-level",
  "2.10": 293.15,
  "2.07-1": 0.6,
  "4.03": 0.02,
  "4.05": 228.15,
  "A5.02": 0.03,
  "A6.08": 100,
  "A7.09": 200000,
  "A7.10": 1200,
  "A7.11": 150000,
};
const gas: Lines = { ...drum, "2.08": "pressure-temperature", "2.09": 6e6, "2.10": 300, "A7.09": 790000 };
const methane: [string, number][] = [["methane", 100]];

function made(draft: DraftDocument): BlowdownCase {
  const { document, missing, problems } = caseFromDraft(draft, "A", site);
  expect({ missing, problems }).toEqual({ missing: [], problems: [] });
  if (!document) throw new Error("no case was made");
  const parsed = parseCase(document);
  expect(parsed).toMatchObject({ ok: true });
  return document;
}

const optionsOf = (no: string) => (lines.find((line) => line.no === no) as ChoiceLine).options.map(({ value }) => value);

/** Every choice of the form that changes the case: which lines, on which start, and what the case then says. */
const choices: [name: string, draft: DraftDocument, says: object][] = [
  ...optionsOf("2.03").map((heads): [string, DraftDocument, object] => [
    `heads ${heads}`,
    draftOf({ ...drum, "2.03-1": heads }),
    { vessel: { geometry: { shape: "cylinder", orientation: "horizontal", heads } } },
  ]),
  [
    "a standing cylinder",
    draftOf({ ...drum, "2.02-1": "cylinder-vertical" }),
    { vessel: { geometry: { orientation: "vertical" } } },
  ],
  ["a sphere", draftOf({ ...drum, "2.02-1": "sphere" }), { vessel: { geometry: { shape: "sphere", insideDiameterM: 1.6 } } }],
  [
    "a plain volume with liquid as a part of it",
    draftOf({ ...drum, "2.02-1": "volume", "2.06-1": 5, "4.04": 18, "2.14": 0.4 }),
    { vessel: { geometry: { shape: "volume", volumeM3: 5, innerAreaM2: 18 } }, start: { liquidVolumeFraction: 0.4 } },
  ],
  ["pressure and temperature", draftOf(gas, methane), { start: { pressurePa: 6e6, temperatureK: 300 } }],
  [
    "temperature and a part of the volume",
    draftOf({ ...drum, "2.13": "part", "2.14": 0.25 }),
    { start: { temperatureK: 293.15, liquidVolumeFraction: 0.25 } },
  ],
  [
    "pressure and liquid",
    draftOf({ ...drum, "2.08": "pressure-level", "2.09": 8e5, "2.13": "part", "2.14": 0.25 }),
    { start: { pressurePa: 8e5, liquidVolumeFraction: 0.25 } },
  ],
  ["no wall", draftOf({ ...drum, "4.08": "none" }), { heat: { wall: { model: "none" }, inside: { model: "none" } } }],
  [
    "a wall with a profile, insulation, mass and specific heat of its own",
    draftOf(
      {
        ...gas,
        "4.08": "conduction",
        "A6.02": "ambient",
        "A6.10": 288.15,
        "A6.11": 8,
        "4.12": "fitted",
        "4.13": 0.05,
        "4.14": 0.04,
        "4.10": 5000,
        "4.15": 480,
        "4.11": 8e6,
      },
      methane,
    ),
    {
      vessel: {
        wall: {
          massKg: 5000,
          specificHeatJPerKgK: 480,
          designPressurePa: 8e6,
          insulation: { thicknessM: 0.05, conductivityWPerMK: 0.04 },
        },
      },
      heat: { wall: { model: "conduction" }, outside: { model: "ambient", temperatureK: 288.15, coefficientWPerM2K: 8 } },
    },
  ],
  ["films by correlation", draftOf({ ...drum, "A6.01": "correlations" }), { heat: { inside: { model: "correlations" } } }],
  ["no film", draftOf({ ...drum, "A6.01": "none" }), { heat: { inside: { model: "none" }, wall: { model: "lumped" } } }],
  [
    "constant heat",
    draftOf({ ...drum, "A6.02": "constant-heat", "A6.09": 50000 }),
    { heat: { outside: { model: "constant-heat", heatW: 50000 } } },
  ],
  [
    "a pool fire on the wetted area",
    draftOf({ ...drum, "A6.02": "pool-fire", "A6.12": "adequate", "A6.13": 0.3, "A6.05": "API Std 521", "A7.10": 300 }),
    { heat: { outside: { model: "pool-fire", drainage: "adequate", environmentFactor: 0.3 } } },
  ],
  ...optionsOf("6.03").map((basis): [string, DraftDocument, object] => [
    `a surface fire, ${basis}`,
    draftOf({ ...drum, "A6.02": "surface-fire", "A6.03": basis, "A7.10": 120 }),
    { heat: { outside: { model: "surface-fire", basis } } },
  ]),
  [
    "a surface fire of constant flux",
    draftOf({ ...drum, "A6.02": "surface-fire", "A6.04": 60000, "A7.10": 120 }),
    { heat: { outside: { basis: "open-pool", heatFluxWPerM2: 60000 } } },
  ],
  [
    "a control valve that opens slowly",
    draftOf({ ...gas, "A5.01": "valve", "A5.07": 40, "A5.08": 0.7, "A5.05": 10 }, methane),
    { release: { path: "valve", cv: 40, xt: 0.7, openingTimeS: 10 } },
  ],
  [
    "an orifice to be found for the target of the policy",
    draftOf({ ...gas, "A5.01": "sized" }, methane),
    { release: { path: "sized", targetPressurePa: 790000, targetTimeS: 900 } },
  ],
  [
    "an orifice to be found for a target of its own",
    draftOf({ ...gas, "A5.01": "sized", "A5.10": 3e6, "A5.11": 600 }, methane),
    { release: { path: "sized", targetPressurePa: 3e6, targetTimeS: 600 } },
  ],
  ...optionsOf("5.06").map((from): [string, DraftDocument, object] => [
    `an outlet from the ${from}`,
    draftOf({ ...drum, "A5.06": from, "A5.09": "equilibrium" }),
    { release: { from, flowModel: "equilibrium" } },
  ]),
  [
    "a pipe run",
    draftOf({ ...gas, "2.02-1": "pipe", "2.04-1": 0.3, "2.05-1": 40 }, methane),
    { vessel: { geometry: { shape: "pipe", insideDiameterM: 0.3, lengthM: 40 } } },
  ],
  [
    "a section closed in until it is cold",
    draftOf({ ...gas, "2.11": 273.15, "A6.14": 268.15, "A6.15": 10, "A7.13": "present" }, methane),
    {
      start: { pressurePa: 6e6, temperatureK: 300, restAtTemperatureK: 273.15 },
      afterwards: { ambientTemperatureK: 268.15, coefficientWPerM2K: 10 },
      limits: { waterPresent: true },
    },
  ],
  [
    "a relief device in a surface fire",
    draftOf(
      { ...gas, "A5.01": "relief", "A5.12": 2e-4, "A5.13": 6.5e6, "A5.14": 5.8e6, "A6.02": "surface-fire", "A7.10": 200 },
      methane,
    ),
    { release: { path: "relief", areaM2: 2e-4, setPressurePa: 6.5e6, reseatPressurePa: 5.8e6 } },
  ],
  [
    "an orifice with a tail pipe",
    draftOf({ ...gas, "A5.15": "fitted", "A5.16": 30, "A5.17": 0.08, "A5.19": 1.5 }, methane),
    { release: { tailPipe: { lengthM: 30, diameterM: 0.08, roughnessM: 4.6e-5, lossCoefficient: 1.5 } } },
  ],
  [
    "a back pressure and a wider near band",
    draftOf({ ...drum, "A5.04": 180000, "A7.08": 15, "A7.12": 0.2 }),
    { release: { backPressurePa: 180000 }, limits: { nearBandK: 15, nearBandFraction: 0.2 } },
  ],
];

describe("every choice of the form", () => {
  it.each(choices)("%s makes a case that parses and runs", (_name, draft, says) => {
    const document = made(draft);
    expect(document).toMatchObject(says);
    const result = runBlowdown(document, { coarse: true });
    expect(result.series.timeS.length).toBeGreaterThan(2);
    expect(Number.isFinite(result.summary.finalPressurePa)).toBe(true);
  });
});

describe("lines that are not asked for", () => {
  it("keep what was typed and stay out of the case", () => {
    const draft = draftOf({ ...gas, "A5.07": 40, "A6.09": 9000, "2.14": 0.5, "4.13": 0.1 }, methane);
    const document = made(draft);
    expect(document.release).toMatchObject({ path: "orifice", diameterM: 0.03 });
    expect(document.heat.outside).toEqual({ model: "adiabatic" });
    expect(document.start).toEqual({ pressurePa: 6e6, temperatureK: 300 });
    expect(document.vessel.wall).not.toHaveProperty("insulation");
    expect(draft.lines["A5.07"]?.si).toBe(40);
  });
});

describe("lines held against each other", () => {
  it.each([
    ["2.07-1", { ...drum, "2.07-1": 1.7 }, "above the top"],
    ["A6.02", { ...drum, "2.02-1": "volume", "2.06-1": 5, "4.04": 18, "2.14": 0.4, "A6.02": "pool-fire" }, "wetted surface"],
    ["A5.10", { ...gas, "A5.01": "sized", "A5.10": 9e6 }, "below the pressure at start"],
    ["A5.14", { ...gas, "A5.01": "relief", "A5.12": 2e-4, "A5.13": 5e6, "A5.14": 5e6 }, "reseat below"],
    ["A5.10", { ...gas, "A5.01": "sized", "A5.10": 2e5, "A5.04": 3e5 }, "above the back pressure"],
  ] as [string, Lines, string][])("cites line %s", (line, given, words) => {
    const { document, problems } = caseFromDraft(draftOf(given, methane), "A", site);
    expect(document).toBeUndefined();
    expect(problems).toEqual([{ line, message: expect.stringContaining(words) as string }]);
  });
});

describe("a path of the case", () => {
  it.each([
    ["release.backPressurePa", "A5.04"],
    ["heat.outside.coefficientWPerM2K", "A6.11"],
    ["vessel.geometry", "2.02-1"],
    ["start.liquidVolumeFraction", "2.14"],
    ["fluid.components[1].moleFraction", "3.01"],
    ["release.path", "A5.01"],
    ["nowhere.at.all", undefined],
  ])("%s leads back to line %s", (path, key) => expect(lineKeyOfPath(path, "A")).toBe(key));

  it("leads to a line for every key that the form can write", () => {
    const paths = (value: unknown, at: string): string[] =>
      typeof value === "object" && value !== null
        ? Object.entries(value).flatMap(([key, inner]) => paths(inner, at ? `${at}.${key}` : key))
        : [at];
    const written = new Set(choices.flatMap(([, draft]) => paths(made(draft), "")));
    const headless = [...written].filter((path) => !/^(format|kind|fluid)/.test(path) && path !== "run.relativeTolerance");
    expect(headless.filter((path) => lineKeyOfPath(path, "A") === undefined)).toEqual([]);
  });
});

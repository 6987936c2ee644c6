import { walled } from "./asked";
import type { Line } from "./line";

const target = { part: 7, group: "Time and pressure" } as const;
const steel = { part: 7, group: "Steel" } as const;
const vent = { part: 7, group: "Disposal" } as const;
const water = { part: 7, group: "Hydrate and ice" } as const;
const near = { part: 7, group: "Near band" } as const;
const run = { part: 7, group: "How long to compute" } as const;

/**
 * Limits start from the facility's policy (dashed until set here). A line with a `policy` key of the same name takes the policy's
 * value when it is empty.
 */
export const limitLines: Line[] = [
  {
    ...target,
    kind: "quantity",
    no: "7.01",
    label: "Time to target pressure",
    hint: "at most",
    quantity: "time",
    min: 1,
    max: 86400,
    shown: { SI: "min", US: "min" },
    optional: true,
  },
  {
    ...target,
    kind: "quantity",
    no: "7.09",
    label: "Target pressure",
    quantity: "pressure",
    min: 1e4,
    max: 1e8,
    shown: { SI: "bar(g)", US: "psig" },
    optional: true,
  },
  {
    ...steel,
    kind: "quantity",
    no: "7.02",
    label: "Steel above its rated temperature",
    hint: "line 4.05 plus this margin",
    asked: walled,
    quantity: "temperatureDifference",
    min: 0,
    max: 100,
    shown: { SI: "K", US: "°F difference" },
    optional: true,
  },
  {
    ...vent,
    kind: "quantity",
    no: "7.03",
    label: "Fluid leaving the opening",
    hint: "not colder than",
    quantity: "temperature",
    min: 20,
    max: 900,
    shown: { SI: "°C", US: "°F" },
    optional: true,
  },
  {
    ...vent,
    kind: "quantity",
    no: "7.04",
    label: "Peak vent load",
    hint: "at most",
    quantity: "massRate",
    min: 1e-6,
    max: 1e5,
    shown: { SI: "kg/s", US: "lb/h" },
    optional: true,
  },
  {
    ...water,
    kind: "choice",
    no: "7.13",
    label: "Free water",
    hint: "hydrate and ice are judged where there is some",
    sourceFree: true,
    options: [
      { value: "by-composition", label: "As the composition says" },
      { value: "present", label: "Present in any case" },
    ],
    initial: "by-composition",
  },
  {
    ...near,
    kind: "quantity",
    no: "7.08",
    label: "Near, by temperature",
    hint: "within this of a limit; only wider than 10 K",
    quantity: "temperatureDifference",
    min: 10,
    max: 100,
    shown: { SI: "K", US: "°F difference" },
    optional: true,
  },
  {
    ...near,
    kind: "quantity",
    no: "7.12",
    label: "Near, by share",
    hint: "within this share of a limit; only wider than 10 %",
    quantity: "fraction",
    min: 0.1,
    max: 1,
    shown: { SI: "%", US: "%" },
    optional: true,
  },
  {
    ...run,
    kind: "quantity",
    no: "7.10",
    label: "Compute for at most",
    quantity: "time",
    min: 1,
    max: 864000,
    shown: { SI: "min", US: "min" },
    initial: { si: 3600, why: "long enough to see the steel's minimum" },
  },
  {
    ...run,
    kind: "quantity",
    no: "7.11",
    label: "Or down to a pressure of",
    quantity: "pressure",
    min: 1e4,
    max: 1e8,
    shown: { SI: "bar(a)", US: "psia" },
    initial: { si: 120000, why: "just above atmosphere" },
  },
];

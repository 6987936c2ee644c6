import type { Line } from "./line";

const opening = { part: 5, group: "Opening" } as const;

export const releaseLines: Line[] = [
  {
    ...opening,
    kind: "choice",
    no: "5.01",
    label: "Kind of opening",
    options: [{ value: "orifice", label: "Orifice or nozzle" }],
    initial: "orifice",
  },
  { ...opening, kind: "quantity", no: "5.02", label: "Bore", quantity: "length", min: 1e-4, max: 2, shown: { SI: "mm", US: "in" } },
  {
    ...opening,
    kind: "quantity",
    no: "5.03",
    label: "Discharge coefficient",
    hint: "high is cautious for cold and load, low for time",
    quantity: "fraction",
    min: 0,
    max: 1,
    exclusiveMin: true,
    shown: { SI: "–", US: "–" },
    initial: { si: 0.84, why: "sharp-edged orifice, gas, choked; common practice" },
  },
  {
    ...opening,
    kind: "quantity",
    no: "5.04",
    label: "Back pressure",
    quantity: "pressure",
    min: 1000,
    max: 5e7,
    shown: { SI: "bar(g)", US: "psig" },
    initial: { si: 101325, why: "vented to atmosphere" },
  },
  {
    ...opening,
    kind: "quantity",
    no: "5.05",
    label: "Valve opens in",
    hint: "linear stroke; 0 for at once",
    quantity: "time",
    min: 0,
    max: 600,
    shown: { SI: "s", US: "s" },
    initial: { si: 0, why: "opens at once: highest load" },
  },
  {
    ...opening,
    kind: "choice",
    no: "5.09",
    label: "Flow in the throat",
    sourceFree: true,
    options: [
      { value: "frozen", label: "Gas stays gas" },
      { value: "equilibrium", label: "Gas may condense" },
    ],
    initial: "frozen",
  },
];

import type { Line } from "./line";

export const fluidLines: Line[] = [
  { kind: "composition", no: "3.01", part: 3, group: "Composition", label: "Composition" },
  {
    kind: "choice",
    no: "3.02",
    part: 3,
    group: "Equation of state",
    label: "Equation of state",
    hint: "decides density, energy and temperature",
    sourceFree: true,
    options: [{ value: "peng-robinson-1976", label: "Peng–Robinson 1976" }],
    initial: "peng-robinson-1976",
  },
  {
    kind: "choice",
    no: "3.03",
    part: 3,
    group: "Equation of state",
    label: "Binary interaction",
    sourceFree: true,
    options: [
      { value: "library", label: "Published values, where there are any" },
      { value: "none", label: "None, all zero" },
    ],
    initial: "library",
  },
];

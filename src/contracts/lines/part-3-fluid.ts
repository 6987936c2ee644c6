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
    // Van der Waals and Redlich-Kwong can be computed from a case file for comparison; neither is a basis for a figure that is signed.
    options: [
      { value: "peng-robinson-1976", label: "Peng–Robinson 1976" },
      { value: "peng-robinson-1978", label: "Peng–Robinson 1978" },
      { value: "soave-redlich-kwong", label: "Soave–Redlich–Kwong" },
      { value: "gerg-2008", label: "GERG-2008, natural gas" },
      { value: "reference", label: "Reference equation, pure fluid" },
    ],
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

import { insulatedFaceTemperatureK, overallCoefficient } from "../../heat/wall-series";
import { gives, number, numbers } from "../field";
import { defineMethod } from "../method";
import { EngineError } from "../../errors";

const coefficient = (symbol: string, title: string) => number(symbol, title, "W/(m² K)", { above: 0, max: 1e6 });

export const overall = defineMethod({
  id: "heat-overall-coefficient",
  chapter: "heat",
  title: "Overall coefficient of a flat wall in layers",
  source: "Resistances in series",
  formula: String.raw`\frac{1}{U}=\frac{1}{h_i}+\sum_j\frac{L_j}{k_j}+\frac{1}{h_o}`,
  inputs: {
    insideWPerM2K: coefficient("h_i", "Film inside"),
    outsideWPerM2K: coefficient("h_o", "Film outside"),
    thicknessesM: numbers("L_j", "Thickness of each layer", "m", { above: 0, max: 10, most: 20 }),
    conductivitiesWPerMK: numbers("k_j", "Conductivity of each layer", "W/(m K)", { above: 0, max: 1e4, most: 20 }),
  },
  outputs: { coefficientWPerM2K: gives("U", "Overall coefficient", "W/(m² K)") },
  evaluate: ({ insideWPerM2K, outsideWPerM2K, thicknessesM, conductivitiesWPerMK }) => {
    if (thicknessesM.length !== conductivitiesWPerMK.length) {
      throw new EngineError("invalid-case", "Give one conductivity for each thickness.", {}, "inputs.conductivitiesWPerMK");
    }
    const layers = thicknessesM.map((thicknessM, i) => ({ thicknessM, conductivityWPerMK: conductivitiesWPerMK[i] ?? 1 }));
    return { coefficientWPerM2K: overallCoefficient(insideWPerM2K, layers, outsideWPerM2K) };
  },
});

export const slab = defineMethod({
  id: "heat-slab-step",
  chapter: "heat",
  title: "Outer face of an insulated slab after a step at the inner face",
  source: "Carslaw and Jaeger, exact series",
  formula: String.raw`\frac{T-T_i}{T_0-T_i}=\frac{4}{\pi}\sum_{n=0}^\infty\frac{(-1)^n}{2n+1}\exp\!\left[-\frac{(2n+1)^2\pi^2\alpha t}{4L^2}\right]`,
  inputs: {
    thicknessM: number("L", "Thickness", "m", { above: 0, max: 10 }),
    diffusivityM2PerS: number("\\alpha", "Thermal diffusivity", "m²/s", { above: 0, max: 1 }),
    startK: number("T_0", "Temperature at start", "K", { above: 0, max: 3000 }),
    innerFaceK: number("T_i", "Temperature of the inner face from then on", "K", { above: 0, max: 3000 }),
    timeS: number("t", "Time", "s", { min: 0, max: 1e9 }),
  },
  outputs: { outerFaceK: gives("T", "Temperature of the outer face", "K") },
  evaluate: (given) => ({ outerFaceK: insulatedFaceTemperatureK(given) }),
});

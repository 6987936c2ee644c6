import { expect, it } from "vitest";
import type { PathCase } from "@/engine/cases/path-case";
import { answerFluid } from "@/workers/fluid-asks";
import { changeText } from "./change-text";

const document: PathCase = {
  format: "ebbmark-case/1",
  kind: "path",
  fluid: { components: [{ id: "methane", moleFraction: 1 }], equation: "peng-robinson-1976", interaction: "library" },
  from: { temperatureK: 300, pressurePa: 100e5 },
  to: { temperatureK: 250, pressurePa: 10e5 },
};

it("names what it rests on, every step with its sign in plain ASCII, and the caution", () => {
  const { kind, value } = answerFluid({ kind: "change", document });
  if (kind !== "change") throw new Error("another answer came back");
  const text = changeText(document, value, { system: "SI", date: "1 December 2026" });
  expect(text).toContain("Equation: Peng–Robinson 1976, binary interaction as published");
  expect(text).toContain("Composition, mol %: Methane 100.000");
  expect(text).toContain("From: 100 bar(a), 26.9 °C, supercritical");
  expect(text).toMatch(
    /Enthalpy, kJ\/mol\n {2}Departure out: \+\d\.\d+\n {2}Ideal-gas change: -\d\.\d+\n {2}Departure back: -0\.\d+\n {2}Change, sum of the steps: /,
  );
  expect(text).toContain("C1 This is a screening.");
  expect(text).not.toMatch(/[\u2212\u00a0\u202f]|NaN/);
});

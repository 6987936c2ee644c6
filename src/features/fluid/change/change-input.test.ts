import { describe, expect, it } from "vitest";
import { parseCaseText } from "@/contracts/case-file";
import { standardAtmospherePa } from "@/engine/units";
import {
  caseOfInput,
  changeFromText,
  changeOfFluid,
  changeToText,
  compositionProblem,
  emptyChange,
  type ChangeInput,
} from "./change-input";

const row = (id: string, typed: string, molePercent: number | null = Number(typed)) => ({ id, typed, molePercent });
const input: ChangeInput = {
  ...emptyChange("SI"),
  rows: [row("methane", "90.0"), row("ethane", "10")],
  from: { pressure: { text: "70", unit: "bar(g)" }, temperature: { text: "35", unit: "°C" } },
  to: { pressure: { text: "100 psia", unit: "bar(a)" }, temperature: { text: "-40", unit: "°F" } },
};

describe("a change of state in an address", () => {
  it.each([
    input,
    emptyChange("US"),
    { ...input, normalised: true, equation: "gerg-2008" as const, interaction: "none" as const },
  ])("comes back as it was typed", (one) => expect(changeFromText(changeToText(one))).toEqual(one));

  it("keeps text that can't be read, and a figure not typed yet", () => {
    const odd = { ...input, rows: [row("methane", "9o", null), row("ethane", "", null)] };
    expect(changeFromText(changeToText(odd))).toEqual(odd);
  });

  it("is nothing where something else stands, and leaves out what the library does not know", () => {
    expect(changeFromText("")).toBeNull();
    expect(changeFromText("line-3.02")).toBeNull();
    const strange = changeToText(input).replace("%7Cethane", "%7Cphlogiston");
    expect(changeFromText(strange)?.rows.map(({ id }) => id)).toEqual(["methane"]);
  });
});

describe("the case of a change of state", () => {
  it("is one that the case format accepts, in SI", () => {
    const document = caseOfInput(input, standardAtmospherePa);
    const parsed = parseCaseText(JSON.stringify(document));
    expect(parsed.ok).toBe(true);
    expect(document?.from.pressurePa).toBeCloseTo(70e5 + standardAtmospherePa, 6);
    expect(document?.to.pressurePa).toBeCloseTo(689_475.7, 0);
    expect(document?.to.temperatureK).toBeCloseTo(233.15, 10);
  });

  it("is scaled by the person's own act alone", () => {
    const off = { ...input, rows: [row("methane", "89"), row("ethane", "10")] };
    expect(compositionProblem(off)).toMatch(/sum to 99.000/);
    expect(caseOfInput(off, standardAtmospherePa)).toBeUndefined();
    const scaled = caseOfInput({ ...off, normalised: true }, standardAtmospherePa);
    expect(scaled?.fluid.components[0]?.moleFraction).toBeCloseTo(89 / 99, 12);
    expect(compositionProblem({ ...off, rows: [row("methane", "8.9")], normalised: true })).toMatch(/too far from 100/);
  });

  it("waits for both states", () => {
    expect(caseOfInput({ ...input, to: emptyChange("SI").to }, standardAtmospherePa)).toBeUndefined();
  });

  it("begins with the fluid and the start of a screening", () => {
    const fluid = {
      components: [
        { id: "methane", moleFraction: 1 / 3 },
        { id: "ethane", moleFraction: 2 / 3 },
      ],
      equation: "gerg-2008" as const,
    };
    const made = changeOfFluid(fluid, { temperatureK: 308.15, pressurePa: 7_101_325 }, "SI");
    expect(compositionProblem(made)).toBeUndefined();
    expect(made.rows[0]?.typed).toBe("33.3333333");
    expect(made.from).toEqual({ pressure: { text: "71.0132", unit: "bar(a)" }, temperature: { text: "35.0", unit: "°C" } });
  });
});

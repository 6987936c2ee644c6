import { describe, expect, it } from "vitest";
import { stepSentence } from "./step-words";

const say = (
  ...[step, property, value]: [...(Parameters<typeof stepSentence> extends [infer S, infer P, unknown] ? [S, P] : never), number]
) => stepSentence(step, property, { value, size: "2.10 kJ/mol", scale: 2100 });

describe("the sign of a step", () => {
  it("out of the real fluid is positive where attraction has lowered it below the ideal gas", () => {
    expect(say("departureOut", "enthalpyJPerMol", 2100)).toBe(
      "Positive: at the first state the real fluid has 2.10 kJ/mol less enthalpy than the ideal gas at the same temperature and pressure.",
    );
    expect(say("departureOut", "enthalpyJPerMol", -2100)).toMatch(/^Negative: .* more enthalpy/);
  });

  it("back into the real fluid reads the other way round", () => {
    expect(say("departureBack", "internalEnergyJPerMol", -2100)).toMatch(
      /^Negative: at the second state .* less internal energy/,
    );
  });

  it("across counts pressure for entropy alone", () => {
    expect(say("idealGas", "enthalpyJPerMol", -2100)).toMatch(/loses .* pressure does not count/);
    expect(say("idealGas", "entropyJPerMolK", -2)).toMatch(/temperature and pressure; both count/);
  });

  it("is zero below round-off, never a signed nothing", () => {
    expect(say("total", "enthalpyJPerMol", -1e-9)).toBe("Zero: the fluid ends as it began.");
  });
});

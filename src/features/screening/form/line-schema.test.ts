import { describe, expect, it } from "vitest";
import { newDraft, type DraftDocument } from "@/contracts/draft";
import { defaultPolicy } from "@/contracts/policy";
import { lineErrors } from "./line-schema";

const site = { barometricPressurePa: 101325, policy: defaultPolicy };

function errorsOf(key: string, typed: string, unit: string | null, shownIn = unit ?? ""): string | undefined {
  const draft: DraftDocument = newDraft("t");
  draft.lines[key] = { typed, unit, si: null, source: null };
  return lineErrors(draft, site, () => shownIn)[key];
}

describe("the schemas of the form's lines", () => {
  it("take what can be computed", () => {
    expect(errorsOf("4.03", "25.4", "mm")).toBeUndefined();
    expect(errorsOf("4.03", "1 in", "mm")).toBeUndefined();
    expect(errorsOf("2.09", "1450 psig", "bar(g)")).toBeUndefined();
  });

  it("leave an empty line to the part list: missing is not wrong", () => {
    expect(errorsOf("4.03", "", "mm")).toBeUndefined();
    expect(errorsOf("4.03", "   ", "mm")).toBeUndefined();
  });

  it("say the range that holds, in the unit in use", () => {
    expect(errorsOf("4.03", "9000", "mm")).toMatch(/too high.*0\.5.* to 500.*mm/);
    expect(errorsOf("4.03", "400", "in", "in")).toMatch(/too high.*19\.68.*in/);
    expect(errorsOf("A5.03", "0", "–")).toMatch(/too low.*above 0.* to 1/);
    expect(errorsOf("2.10", "-300", "°C")).toMatch(/too low/);
  });

  it("say what is no number, and what is no unit of the line", () => {
    expect(errorsOf("4.03", "thick", "mm")).toContain("no number in front");
    expect(errorsOf("4.03", "25 barg", "mm")).toContain("barg");
    expect(errorsOf("4.03", "1,5", "mm")).toContain("comma");
    expect(errorsOf("2.09", "70 bar", "bar(g)")).toMatch(/gauge or absolute/);
  });

  it("hold choices and texts to the registry", () => {
    expect(errorsOf("4.02", "unobtainium", null)).toContain("not one of the choices");
    expect(errorsOf("2.01-1", "x".repeat(41), null)).toContain("40 characters");
  });

  it("are silent about lines that are not asked for", () => {
    const draft = newDraft("t");
    draft.lines["4.08"] = { typed: "none", unit: null, si: null, source: null };
    draft.lines["4.03"] = { typed: "thick", unit: "mm", si: null, source: null };
    expect(lineErrors(draft, site, () => "mm")).toEqual({});
  });
});

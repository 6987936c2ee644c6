import { describe, expect, it } from "vitest";
import { lineWords, partOfLine } from "./line-words";

const line = (fields: { line: string; typed: string; unit: string | null; si: number | null }) => ({
  label: "",
  siUnit: null,
  source: null,
  ...fields,
});
const at = (system: "SI" | "US") => ({ system, barometricPressurePa: 101325 });

describe("a line of a record", () => {
  it("stands as it was typed where its unit is the one shown", () => {
    expect(lineWords(line({ line: "4.03", typed: "25.40", unit: "mm", si: 0.0254 }), at("SI"))).toEqual({
      value: "25.40\u00a0mm",
      typed: null,
    });
  });

  it("is converted for the other system, with what was typed beside it", () => {
    expect(lineWords(line({ line: "4.03", typed: "25.40", unit: "mm", si: 0.0254 }), at("US"))).toEqual({
      value: "1.000\u00a0in",
      typed: "25.40\u00a0mm",
    });
    expect(lineWords(line({ line: "2.10", typed: "-20", unit: "°F", si: 244.2611 }), at("SI"))).toEqual({
      value: "−28.9\u00a0°C",
      typed: "−20\u00a0°F",
    });
  });

  it("is the word chosen where it is no figure", () => {
    expect(lineWords(line({ line: "2.02", typed: "Sphere", unit: null, si: null }), at("US"))).toEqual({
      value: "Sphere",
      typed: null,
    });
  });

  it("knows the part it is edited in", () => {
    expect(partOfLine("A7.02")?.slug).toBe("limits");
    expect(partOfLine("2.04-1")?.slug).toBe("inventory");
    expect(partOfLine("9.99")).toBeUndefined();
  });
});

import { describe, expect, it } from "vitest";
import { assumedLinesCaution, liquidCaution, oneTemperatureCaution, screeningCaution } from "./cautions";

describe("the standing cautions", () => {
  it("defer to a licensed engineer and the code at the site, in these words", () => {
    expect(screeningCaution.words).toBe(
      "This is a screening. It does not size, rate or approve equipment. A licensed engineer reviews it under the code that applies at the site before anyone relies on it.",
    );
  });

  it("say what one temperature hides, by the wall model in use", () => {
    expect(oneTemperatureCaution("lumped").words).toMatch(
      /^One gas temperature and one wall temperature stand for the whole vessel\. Nozzles/,
    );
    expect(oneTemperatureCaution("none").words).toContain("nothing here says how cold the steel gets");
    expect(oneTemperatureCaution("conduction").words).toContain("through its thickness only");
  });

  it("put in the figures of the run with a true minus sign", () => {
    expect(liquidCaution(264.15).words).toContain("below about \u22129\u00a0°C.");
    expect(liquidCaution(283.15).words).toContain("below about 10\u00a0°C.");
    expect(assumedLinesCaution(1).words).toMatch(/^1 line rests/);
    expect(assumedLinesCaution(7).words).toMatch(/^7 lines rest/);
  });
});

import { describe, expect, it } from "vitest";
import type { AssessedLimit, BlowdownSummary } from "@/engine/cases/blowdown-result";
import { governingFigure, type Shown } from "./governing";

const shown: Shown = (quantity, si) => ({ text: `${quantity} ${si}` });
const summary = { minimumFluidTemperatureK: 216.2, timeToTargetPressureS: 420 } as BlowdownSummary; // only what is read
const limit = (given: Partial<AssessedLimit>): AssessedLimit => ({
  id: "minimum-wall-temperature",
  title: "",
  unit: "K",
  sense: "at-least",
  verdict: "near",
  governs: true,
  ...given,
});

describe("the figure that governs", () => {
  it("is the governing limit's value, with what is in hand", () => {
    const limits = [
      limit({ id: "time-to-target", governs: false, value: 420, unit: "s", sense: "at-most" }),
      limit({ value: 248, inHand: 4 }),
    ];
    expect(governingFigure({ limits, summary }, shown)).toEqual({
      figure: "temperature 248",
      words: "wall, temperatureDifference 4 in hand",
    });
  });

  it("says how far it is past its limit", () => {
    expect(governingFigure({ limits: [limit({ value: 240, inHand: -4 })], summary }, shown).words).toBe(
      "wall, temperatureDifference 4 past the limit",
    );
  });

  it("never shows the end of a run as the time to a target that was not reached", () => {
    const limits = [limit({ id: "time-to-target", value: 3600, unit: "s", sense: "at-most", inHand: -2700 })];
    const found = governingFigure({ limits, summary: { ...summary, timeToTargetPressureS: undefined } }, shown);
    expect(found).toEqual({ figure: "not reached", words: "target pressure" });
  });

  it("is the lowest fluid temperature where no limit governs", () => {
    expect(governingFigure({ limits: [], summary }, shown)).toEqual({ figure: "temperature 216.2", words: "lowest fluid" });
  });
});

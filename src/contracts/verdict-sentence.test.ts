import { describe, expect, it } from "vitest";
import type { AssessedLimit, BlowdownSummary } from "@/engine/cases/blowdown-result";
import { limitSentence, runSentence, worstVerdict } from "./verdict-sentence";

const wall = (
  value: number | undefined,
  verdict: AssessedLimit["verdict"],
  limit: number | undefined = 227.15,
): AssessedLimit => ({
  id: "minimum-wall-temperature",
  title: "Coldest wall",
  value,
  limit,
  unit: "K",
  sense: "at-least",
  verdict,
  governs: true,
});
const time = (value: number | undefined, verdict: AssessedLimit["verdict"], limit = 900): AssessedLimit => ({
  id: "time-to-target",
  title: "Time to target",
  value,
  limit,
  unit: "s",
  sense: "at-most",
  verdict,
  governs: false,
});
const load = (value: number, verdict: AssessedLimit["verdict"]): AssessedLimit => ({
  id: "peak-vent-rate",
  title: "Peak vent load",
  value,
  limit: 14,
  unit: "kg/s",
  sense: "at-most",
  verdict,
  governs: false,
});

describe("limitSentence", () => {
  it.each([
    [wall(228.95, "near"), "The wall comes within 1.8 K of its minimum design metal temperature."],
    [wall(258.45, "within"), "The wall stays 31.3 K above its minimum design metal temperature."],
    [wall(223.95, "beyond"), "The wall falls 3.2 K below its minimum design metal temperature."],
    [wall(227.15, "beyond"), "The wall comes down to its minimum design metal temperature."],
    [wall(227.151, "near"), "The wall comes within 0.001 K of its minimum design metal temperature."],
    [wall(227.149, "beyond"), "The wall falls 0.001 K below its minimum design metal temperature."],
    [time(504, "within"), "The pressure reaches its target 6.6 min before the time allowed is over."],
    [time(870, "near"), "The pressure reaches its target only 30 s before the time allowed is over."],
    [time(1038, "beyond"), "The pressure reaches its target 2.3 min after the time allowed."],
    [time(undefined, "beyond"), "The pressure does not reach its target while it is computed."],
    [load(12.74, "near"), "The vent load comes within 9 % of its capacity."],
    [load(15.4, "beyond"), "The vent load passes its capacity by 10 %."],
  ] as const)("says of %j: %s", (limit, sentence) => {
    expect(limitSentence(limit).replaceAll("\u00a0", " ")).toBe(sentence);
  });

  it("says that a wall without a rated temperature is not judged", () => {
    expect(limitSentence({ ...wall(250, "open"), limit: undefined })).toBe(
      "No minimum design metal temperature is entered, so the wall is not judged.",
    );
  });

  it("names the margin where there is one", () => {
    expect(limitSentence(wall(232.15, "near"), 3)).toContain("minimum design metal temperature plus the margin of 3.0\u00a0K.");
  });

  it("never uses a word that promises", () => {
    const all = [wall(228, "near"), wall(290, "within"), time(100, "within"), load(3, "within")].map((one) => limitSentence(one));
    for (const sentence of all) expect(sentence).not.toMatch(/safe|pass\b|fail|\bOK\b|approv/i);
  });
});

describe("runSentence", () => {
  const run = (verdict: AssessedLimit["verdict"], limits: AssessedLimit[], timeToTargetPressureS?: number) =>
    runSentence({ verdict, limits, summary: { timeToTargetPressureS } as BlowdownSummary });
  const missing = { ...wall(228, "open"), limit: undefined, governs: false };

  it("speaks of the limit that governs", () => {
    expect(run("near", [time(504, "within"), wall(228.95, "near")], 504)).toContain("1.8\u00a0K");
  });
  it("speaks of the missing limit while nothing is past another, and of the one past it otherwise", () => {
    expect(run("open", [{ ...time(504, "within"), governs: true }, missing], 504)).toContain("so the wall is not judged");
    expect(run("beyond", [{ ...time(1038, "beyond"), governs: true }, missing], 1038)).toContain("after the time allowed");
  });
  it("does not take the end of a run for an arrival at the target", () => {
    const cut = { ...time(3600, "beyond"), governs: true };
    expect(run("beyond", [cut])).toBe("The pressure does not reach its target while it is computed.");
  });
  it("says that the steel is not judged where no wall is in the balance", () => {
    expect(run("open", [{ ...wall(undefined, "open"), governs: false }])).toBe(
      "No wall is in the balance, so the steel is not judged.",
    );
  });
  it("says so where there is no limit at all", () => expect(run("open", [])).toBe("No limit is set, so nothing is judged."));
});

describe("worstVerdict", () => {
  it.each([
    [["within", "near"], "near"],
    [["near", "open"], "open"],
    [["open", "beyond"], "beyond"],
    [["within"], "within"],
    [[], "open"],
  ] as const)("of %j is %s", (verdicts, worst) => expect(worstVerdict(verdicts)).toBe(worst));
});

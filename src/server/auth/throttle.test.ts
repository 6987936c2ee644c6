import { describe, expect, it } from "vitest";
import { hardStop, waitAfterS, waitWords } from "./throttle";

describe("waitAfterS", () => {
  it.each([
    [0, 0],
    [4, 0],
    [5, 30],
    [6, 60],
    [7, 120],
    [11, 1920],
    [12, 3600],
    [hardStop, 3600],
  ])("after %d wrong passwords in a row is %d s", (failures, seconds) => expect(waitAfterS(failures)).toBe(seconds));

  it("never falls as failures grow", () => {
    for (let failures = 1; failures <= hardStop; failures++)
      expect(waitAfterS(failures)).toBeGreaterThanOrEqual(waitAfterS(failures - 1));
  });
});

describe("waitWords", () => {
  it.each([
    [1, "1 s"],
    [119, "119 s"],
    [120, "2 min"],
    [121, "3 min"],
    [3600, "60 min"],
  ])("says %d s as %s", (seconds, words) => expect(waitWords(seconds)).toBe(words));
});

import { expect, it } from "vitest";
import { valueAtTime } from "./value-at-time";

// A jump has its time twice: before, then after.
const times = [0, 10, 10, 20];
const values = [100, 50, 40, 30];

it.each([
  [0, 100],
  [5, 75],
  [10, 50],
  [15, 35],
  [20, 30],
  [20.1, null],
  [-1, null],
])("at %s s reads %s", (at, value) => expect(valueAtTime(times, values, at)).toBe(value));

it("says nothing of a run without rows", () => expect(valueAtTime([], [], 0)).toBeNull());

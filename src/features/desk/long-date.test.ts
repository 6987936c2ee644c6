import { expect, it } from "vitest";
import { longDate, since } from "./long-date";

it("writes the day in full", () => expect(longDate("2026-12-01T23:59:59Z")).toBe("Tuesday 1 December"));

it.each([
  ["2026-12-01T12:00:00Z", "0 min"],
  ["2026-12-01T11:48:10Z", "11 min"],
  ["2026-12-01T10:59:00Z", "1 hour"],
  ["2026-11-30T10:00:00Z", "26 hours"],
  ["2026-11-27T10:00:00Z", "4 days"],
  ["2026-12-01T12:00:05Z", "0 min"],
])("what came at %s waits since %s", (at, words) => expect(since(at, "2026-12-01T12:00:00Z")).toBe(words));

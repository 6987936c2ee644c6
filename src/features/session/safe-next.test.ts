import { expect, it } from "vitest";
import { safeNext } from "./safe-next";

it.each([
  ["/screenings/7f?rev=2#limit-A7.02", "/screenings/7f?rev=2#limit-A7.02"],
  ["/log?entry=3", "/log?entry=3"],
  [undefined, "/desk"],
  ["", "/desk"],
  ["//elsewhere.invalid/x", "/desk"],
  ["/\\elsewhere.invalid", "/desk"],
  ["/\t/elsewhere.invalid", "/desk"],
  ["https://elsewhere.invalid", "/desk"],
  ["javascript:alert(1)", "/desk"],
  ["/sign-in?next=/sign-in", "/desk"],
])("after signing in, %j leads to %s", (next, to) => {
  expect(safeNext(next)).toBe(to);
});

import { mkdirSync, mkdtempSync, renameSync, rmSync, utimesSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { isOutsideBuild } from "./build.mjs";
import { hashFiles } from "./hash-files.mjs";

let base: string;
beforeEach(() => {
  base = mkdtempSync(join(tmpdir(), "ebbmark-hash-"));
  mkdirSync(join(base, "src"));
  writeFileSync(join(base, "src/a.ts"), "one");
  writeFileSync(join(base, "src/b.ts"), "two");
});
afterEach(() => rmSync(base, { recursive: true }));

const hash = () => hashFiles(base, ["src", "missing.json"], isOutsideBuild);

describe("hashFiles", () => {
  it.each([
    ["an edit", () => writeFileSync(join(base, "src/a.ts"), "One")],
    ["a new file", () => writeFileSync(join(base, "src/c.ts"), "")],
    ["a file gone", () => rmSync(join(base, "src/b.ts"))],
    ["a renaming", () => renameSync(join(base, "src/b.ts"), join(base, "src/c.ts"))],
    [
      "text moved from one file to the next",
      () => (writeFileSync(join(base, "src/a.ts"), "onet"), writeFileSync(join(base, "src/b.ts"), "wo")),
    ],
    ["a file that was missing", () => writeFileSync(join(base, "missing.json"), "{}")],
  ])("changes with %s", (_, change) => {
    const before = hash();
    change();
    expect(hash()).not.toBe(before);
  });

  it("stays with a new time and with a test beside the code", () => {
    const before = hash();
    utimesSync(join(base, "src/a.ts"), 1, 1);
    writeFileSync(join(base, "src/a.test.ts"), "x");
    expect(hash()).toBe(before);
  });
});

it("leaves the commands and tests out of the product, and nothing else", () => {
  expect(
    ["src/ops/up.mjs", "src/engine/x.test.ts", "src/ui/x.bench.tsx", "db/seed/people.ts"].filter((file) => !isOutsideBuild(file)),
  ).toEqual([]);
  expect(["src/app/page.tsx", "src/ops-view.ts", "src/contest.ts", "db/schema/app/draft.ts"].filter(isOutsideBuild)).toEqual([]);
});

import { describe, expect, it } from "vitest";
import { parseTestArguments, parseUpArguments } from "./arguments.mjs";

describe("parseTestArguments", () => {
  it("runs every part when none is named", () => {
    expect(parseTestArguments([])).toEqual({ parts: ["static", "unit", "integration", "e2e"], filters: [] });
  });

  it("keeps the fixed order of parts, and hands other words to the runners", () => {
    expect(parseTestArguments(["e2e", "unit", "ledger"])).toEqual({ parts: ["unit", "e2e"], filters: ["ledger"] });
  });

  it("refuses an option instead of ignoring it", () => {
    expect(() => parseTestArguments(["--watch"])).toThrow(/"--watch" means nothing here/);
  });
});

describe("parseUpArguments", () => {
  it("knows --dev alone", () => {
    expect(parseUpArguments([])).toEqual({ dev: false });
    expect(parseUpArguments(["--dev"])).toEqual({ dev: true });
    expect(() => parseUpArguments(["--port", "3001"])).toThrow(/PORT=3001 npm run up/);
  });
});

import { describe, expect, it } from "vitest";
import { addCounts, closingLine, countCommand, countPlaywright, countVitest, failure } from "./count-tests.mjs";

const file = (status: string, tests: [string, string][], message = "") => ({
  name: `${process.cwd()}/src/a.test.ts`,
  status,
  message,
  assertionResults: tests.map(([fullName, outcome]) => ({ fullName, status: outcome })),
});

describe("countVitest", () => {
  it("counts passed, failed and skipped tests, and names the failed ones", () => {
    const report = { testResults: [file("failed", [["holds", "passed"], ["breaks", "failed"], ["waits", "skipped"], ["is planned", "todo"]])] }; // prettier-ignore
    expect(countVitest("unit", report, 1)).toEqual({ passed: 1, failed: 1, skipped: 2, failures: ["src/a.test.ts > breaks"] });
  });

  it("counts a file that broke before its first test as one failure", () => {
    const report = { testResults: [file("passed", [["holds", "passed"]]), file("failed", [], "Cannot find module 'x'\n at y")] };
    expect(countVitest("unit", report, 1)).toMatchObject({
      passed: 1,
      failed: 1,
      failures: ["src/a.test.ts: Cannot find module 'x'"],
    });
  });

  it("counts a bad end without a failed test as one failure", () => {
    const report = { testResults: [file("passed", [["holds", "passed"]])] };
    expect(countVitest("unit", report, 1)).toMatchObject({ passed: 1, failed: 1 });
    expect(countVitest("unit", report, 0)).toMatchObject({ passed: 1, failed: 0 });
  });

  it("counts a run without a report, or without a test, as one failure", () => {
    expect(countVitest("unit", undefined, 139)).toMatchObject({ passed: 0, failed: 1, failures: ["unit: no report (exit 139)"] });
    expect(countVitest("unit", { testResults: [] }, 0)).toMatchObject({ passed: 0, failed: 1, failures: ["unit: no test ran"] });
  });

  it("takes an outcome that it does not know for a failure", () => {
    expect(countVitest("unit", { testResults: [file("passed", [["is odd", "perhaps"]])] }, 0)).toMatchObject({
      passed: 0,
      failed: 1,
    });
  });
});

describe("countPlaywright", () => {
  const spec = (title: string, status: string) => ({ title, tests: [{ status }] });

  it("counts tests in nested suites; one that passed only when repeated is failed", () => {
    const report = {
      suites: [
        {
          title: "journey.spec.ts",
          specs: [spec("signs in", "expected")],
          suites: [
            {
              title: "approver",
              specs: [spec("countersigns", "flaky"), spec("returns", "unexpected"), spec("waits", "skipped")],
            },
          ],
        },
      ],
      errors: [],
    };
    expect(countPlaywright("e2e", report, 1)).toEqual({
      passed: 1,
      failed: 2,
      skipped: 1,
      failures: ["journey.spec.ts > approver > countersigns", "journey.spec.ts > approver > returns"],
    });
  });

  it("counts an error outside of any test, and a run of nothing", () => {
    const report = { suites: [], errors: [{ message: "\u001b[31mError: No tests found\u001b[0m\nat x" }] };
    expect(countPlaywright("e2e", report, 1)).toMatchObject({ failed: 1, failures: ["e2e: Error: No tests found"] });
    expect(countPlaywright("e2e", { suites: [] }, 0)).toMatchObject({ passed: 0, failed: 1 });
  });
});

it("closes with the sum of all parts in one plain line", () => {
  const total = addCounts([countCommand("lint", 0), countCommand("typecheck", 2), failure("e2e: no browser")]);
  expect(total.failures).toEqual(["typecheck (exit 2)", "e2e: no browser"]);
  expect(closingLine(total)).toBe("1 passed, 2 failed");
});

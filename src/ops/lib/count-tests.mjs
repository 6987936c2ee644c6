/** @typedef {{ passed: number, failed: number, skipped: number, failures: string[] }} Count */

/** @returns {Count} */
export function addCounts(counts) {
  return {
    passed: counts.reduce((sum, count) => sum + count.passed, 0),
    failed: counts.reduce((sum, count) => sum + count.failed, 0),
    skipped: counts.reduce((sum, count) => sum + count.skipped, 0),
    failures: counts.flatMap((count) => count.failures),
  };
}

/** A check that is one command: it passed when it ended with 0. @returns {Count} */
export function countCommand(name, exitCode) {
  return exitCode === 0 ? { passed: 1, failed: 0, skipped: 0, failures: [] } : failure(`${name} (exit ${exitCode})`);
}

/** One failed test that has no report: a runner that crashed, or a step that could not begin. @returns {Count} */
export function failure(name) {
  return { passed: 0, failed: 1, skipped: 0, failures: [name] };
}

/**
 * Counts Vitest's JSON report. A file that broke before its first test counts as one failure, and so does a run that ended badly though
 * no test failed, or that ran nothing.
 *
 * @returns {Count}
 */
export function countVitest(name, report, exitCode) {
  if (!report) return failure(`${name}: no report (exit ${exitCode})`);
  const count = { passed: 0, failed: 0, skipped: 0, failures: [] };
  for (const file of report.testResults) {
    for (const test of file.assertionResults)
      add(count, statusOfVitest[test.status] ?? "failed", `${fileName(file.name)} > ${test.fullName}`);
    if (file.status === "failed" && !file.assertionResults.some((test) => test.status === "failed")) {
      add(count, "failed", `${fileName(file.name)}: ${firstLine(file.message) || "the file could not be run"}`);
    }
  }
  return closeCount(name, count, exitCode);
}

const statusOfVitest = {
  passed: "passed",
  failed: "failed",
  skipped: "skipped",
  pending: "skipped",
  todo: "skipped",
  disabled: "skipped",
};

/**
 * Counts Playwright's JSON report by the outcome of each test. One that passed only when repeated counts as failed.
 *
 * @returns {Count}
 */
export function countPlaywright(name, report, exitCode) {
  if (!report) return failure(`${name}: no report (exit ${exitCode})`);
  const count = { passed: 0, failed: 0, skipped: 0, failures: [] };
  const outcomes = { expected: "passed", skipped: "skipped" };
  const visit = (suite, path) => {
    for (const spec of suite.specs ?? [])
      for (const test of spec.tests) add(count, outcomes[test.status] ?? "failed", [...path, spec.title].join(" > "));
    for (const inner of suite.suites ?? []) visit(inner, [...path, inner.title]);
  };
  for (const suite of report.suites) visit(suite, [suite.title]);
  for (const error of report.errors ?? []) add(count, "failed", `${name}: ${firstLine(error.message)}`);
  return closeCount(name, count, exitCode);
}

/** The plain line that closes a run. */
export function closingLine({ passed, failed }) {
  return `${passed} passed, ${failed} failed`;
}

function closeCount(name, count, exitCode) {
  if (count.passed + count.failed === 0) add(count, "failed", `${name}: no test ran`);
  else if (exitCode !== 0 && count.failed === 0)
    add(count, "failed", `${name}: the runner ended with exit ${exitCode}, though no test failed`);
  return count;
}

function add(count, outcome, name) {
  count[outcome] += 1;
  if (outcome === "failed") count.failures.push(name);
}

function fileName(path) {
  return path.replace(`${process.cwd()}/`, "");
}

function firstLine(text) {
  return (text ?? "")
    .replace(/\u001b\[[0-9;]*m/g, "")
    .split("\n")[0]
    .trim();
}

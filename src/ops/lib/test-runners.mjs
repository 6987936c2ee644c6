import { existsSync, mkdirSync, readFileSync, rmSync } from "node:fs";
import { join } from "node:path";
import { countCommand, countPlaywright, countVitest } from "./count-tests.mjs";
import { home, root } from "./places.mjs";

const reports = join(home, "test-reports");

/** Runs a check that counts as one test: one command or several, all of which must end with 0. Their output goes to the terminal. */
export async function runCheck(processes, name, commands, env) {
  let worst = 0;
  for (const [script, ...args] of commands) {
    const { code } = await processes.runToEnd(name, process.execPath, [join(root, "node_modules", script), ...args], {
      cwd: root,
      env,
      stdio,
    });
    worst = Math.max(worst, code ?? 1);
  }
  return countCommand(name, worst);
}

/** Runs projects of Vitest and counts its JSON report. */
export async function runVitest(processes, name, { projects, filters, env }) {
  const report = freshReport(name);
  const args = [
    "run",
    ...projects.map((project) => `--project=${project}`),
    "--reporter=default",
    "--reporter=json",
    `--outputFile.json=${report}`,
    ...filters,
  ];
  const { code } = await processes.runToEnd(name, process.execPath, [join(root, "node_modules/vitest/vitest.mjs"), ...args], {
    cwd: root,
    env,
    stdio,
  });
  return countVitest(name, readReport(report), code ?? 1);
}

/** Runs the browser tests and counts Playwright's JSON report. */
export async function runPlaywright(processes, name, { filters, env }) {
  const report = freshReport(name);
  const args = [join(root, "node_modules/@playwright/test/cli.js"), "test", ...filters];
  const { code } = await processes.runToEnd(name, process.execPath, args, {
    cwd: root,
    env: { ...env, PLAYWRIGHT_JSON_OUTPUT_NAME: report },
    stdio,
  });
  return countPlaywright(name, readReport(report), code ?? 1);
}

const stdio = ["ignore", "inherit", "inherit"];

/** A report of an earlier run must never be counted for this one. */
function freshReport(name) {
  const file = join(reports, `${name}.json`);
  mkdirSync(reports, { recursive: true });
  rmSync(file, { force: true });
  return file;
}

function readReport(file) {
  if (!existsSync(file)) return undefined;
  try {
    return JSON.parse(readFileSync(file, "utf8"));
  } catch {
    return undefined;
  }
}

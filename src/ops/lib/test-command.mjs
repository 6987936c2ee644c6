import { parseTestArguments } from "./arguments.mjs";
import { buildProduct } from "./build.mjs";
import { checkDisk } from "./check-disk.mjs";
import { refuse, runCommand } from "./command.mjs";
import { addCounts, closingLine, failure } from "./count-tests.mjs";
import { baseEnvironment } from "./environment.mjs";
import { findChromium } from "./find-chromium.mjs";
import { freePort } from "./free-port.mjs";
import { installPackages } from "./install-packages.mjs";
import { root } from "./places.mjs";
import { createProgress } from "./progress.mjs";
import { lastJsonLine, runScript } from "./scripts.mjs";
import { startWeb } from "./services.mjs";
import { createTestGround } from "./test-ground.mjs";
import { abandonedHomes, makeTestHome, removeTestHome } from "./test-home.mjs";
import { runCheck, runPlaywright, runVitest } from "./test-runners.mjs";
import { troubleLine } from "./trouble.mjs";

/** From nothing to one line that counts every test. */
export async function test(args) {
  let options, places;
  try {
    options = parseTestArguments(args);
    checkDisk(root);
    places = makeTestHome();
  } catch (error) {
    return refuse(error);
  }
  await runCommand({
    places,
    cleanUp: () => removeTestHome(places.home),
    work: ({ processes, say }) => runParts({ ...options, places, processes, say }),
  });
}

async function runParts({ parts, filters, places, processes, say }) {
  for (const folder of abandonedHomes()) await removeTestHome(folder);
  const { step } = createProgress(say);
  const run = { filters, places, processes, say, step };
  const counts = [];
  /** A part that cannot even begin is one failed test, and the others still run. */
  const part = async (name, work) => {
    if (!parts.includes(name)) return;
    try {
      counts.push(...(await work(run)));
    } catch (error) {
      await processes.unlessStopping();
      const { line, expected } = troubleLine(error);
      counts.push(failure(`${name}: ${line}`));
      if (!expected) say(error.stack);
    }
  };

  await step("packages", () => installPackages(processes, say));
  run.base = { ...baseEnvironment(), FORCE_COLOR: "0", TMPDIR: places.temporary };
  run.ground = createTestGround(run);
  await part("static", testStatic);
  await part("unit", testUnit);
  await part("integration", testIntegration);
  await part("e2e", testInBrowser);

  const total = addCounts(counts);
  if (total.failures.length > 0) say(["", "Failed:", ...total.failures.map((name) => `  ${name}`)].join("\n"));
  if (total.skipped > 0) say(`${total.skipped} skipped`);
  say(`\n${closingLine(total)}`);
  return total.failed === 0 ? 0 : 1;
}

async function testStatic({ processes, base }) {
  const tsc = "typescript/bin/tsc";
  return [
    await runCheck(processes, "lint", [["eslint/bin/eslint.js", ".", "--max-warnings", "0"]], base),
    await runCheck(processes, "typecheck", [[tsc, "--noEmit"], [tsc, "--noEmit", "-p", "tsconfig.engine.json"]], base), // prettier-ignore
  ];
}

async function testUnit({ ground, processes, places, filters, base }) {
  await ground.workers();
  const env = { ...base, NODE_ENV: "test", EBBMARK_ENGINE_DIR: places.engines };
  return [await runVitest(processes, "unit", { projects: ["unit", "dom"], filters, env })];
}

async function testIntegration({ ground, processes, filters, base }) {
  const { web, database } = await ground.environments({ name: "ebbmark_test", port: await freePort(), nodeEnv: "test" });
  return [
    await runVitest(processes, "integration", { projects: ["integration"], filters, env: { ...base, ...web, ...database } }),
  ];
}

async function testInBrowser({ ground, processes, places, filters, base, say, step }) {
  const chromium = await step("browser", () => findChromium(processes, say));
  const { server } = await step("build", () => buildProduct(processes, places, say));
  const port = await freePort();
  const { web } = await ground.environments({ name: "ebbmark_e2e", port, nodeEnv: "production" });
  const seeded = await step("demo", async () =>
    lastJsonLine(await runScript(processes, "demo", "src/ops/seed.ts", web), "accounts"),
  );
  await step("web server", () => startWeb(processes, { server, port, env: web }));
  const env = {
    ...base,
    BASE_URL: web.EBBMARK_ORIGIN,
    CHROMIUM_PATH: chromium,
    E2E_ACCOUNTS: JSON.stringify(seeded?.accounts ?? []),
    E2E_MAIL_FOLDER: places.mail,
    E2E_SCREENS: places.screens,
  };
  return [await runPlaywright(processes, "e2e", { filters, env })];
}

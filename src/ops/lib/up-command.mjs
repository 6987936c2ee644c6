import { join } from "node:path";
import { parseUpArguments } from "./arguments.mjs";
import { buildEngineFiles } from "./build-engine-files.mjs";
import { buildProduct } from "./build.mjs";
import { checkDisk } from "./check-disk.mjs";
import { refuse, runCommand } from "./command.mjs";
import { baseEnvironment, migrateEnvironment, webEnvironment } from "./environment.mjs";
import { checkPortFree, parsePort } from "./free-port.mjs";
import { installPackages } from "./install-packages.mjs";
import { openDatabase } from "./open-database.mjs";
import { home, makePlaces, placesOf, root } from "./places.mjs";
import { endLeftovers } from "./processes.mjs";
import { createProgress } from "./progress.mjs";
import { lastJsonLine, runScript } from "./scripts.mjs";
import { startFakes, startWeb, untilHealthy } from "./services.mjs";
import { takeLock } from "./single-start.mjs";
import { Trouble } from "./trouble.mjs";
import { welcomeLines } from "./welcome.mjs";

const database = "ebbmark";

/** From nothing to the running product, and on until it is told to stop. */
export async function up(args) {
  const places = placesOf(home);
  let options, port, lock;
  try {
    options = parseUpArguments(args);
    port = parsePort(process.env.PORT);
    checkDisk(root);
    makePlaces(places);
    lock = takeLock(join(home, "up.lock"), { port });
    if (lock.heldBy) throw alreadyRunning(lock.heldBy);
  } catch (error) {
    return refuse(error);
  }
  await runCommand({
    places,
    cleanUp: lock.release,
    work: ({ processes, say }) => start({ ...options, port, places, processes, say }),
  });
}

async function start({ dev, port, places, processes, say }) {
  const { step } = createProgress(say);
  const left = await endLeftovers(places.run);
  if (left.length > 0) say(`  Ended what an earlier start left behind: ${left.join(", ")}.`);
  await checkPortFree(port);

  await step("packages", () => installPackages(processes, say));
  const [server, workers] = await Promise.all([
    step("database", () => openDatabase(processes, places, { say })),
    step("engine", () => buildEngineFiles(processes, places, say)),
  ]);
  const { secrets } = server;
  const migration = migrateEnvironment({ secrets, port: server.port, database });
  const [fakes] = await Promise.all([
    step("stand-ins", () => startFakes(processes, { places, secrets })),
    step("migrations", () => runScript(processes, "migrations", "src/ops/migrate.ts", migration).then(() => {})),
  ]);
  const nodeEnv = dev ? "development" : "production";
  const env = webEnvironment({ secrets, databasePort: server.port, database, port, services: fakes, places, workers, nodeEnv });
  const [seeded, web] = await Promise.all([
    step("demo", async () => lastJsonLine(await runScript(processes, "demo", "src/ops/seed.ts", env), "accounts")),
    dev ? startDevelopment({ step, processes, port, env }) : startProduct({ step, processes, places, say, port, env }),
  ]);

  welcomeLines({ port, accounts: seeded?.accounts, places }).forEach(say);
  return untilOneEnds({
    "The web server": web.ended,
    PostgreSQL: server.ended,
    "The stand-ins for mail and storage": fakes.ended,
  });
}

async function startProduct({ step, processes, places, say, port, env }) {
  const { server } = await step("build", () => buildProduct(processes, places, say));
  return step("web server", () => startWeb(processes, { server, port, env }));
}

async function startDevelopment({ step, processes, port, env }) {
  return step("web server", async () => {
    const args = [join(root, "node_modules/next/dist/bin/next"), "dev", "--hostname", "127.0.0.1", "--port", String(port)];
    const { ended, logFile } = processes.start("web", process.execPath, args, {
      cwd: root,
      env: { ...baseEnvironment(), ...env },
      stdio: ["ignore", "inherit", "inherit"],
    });
    await untilHealthy({ port, ended, logFile });
    return { ended };
  });
}

/** Everything hangs together: when one part ends, the rest is stopped and the person is told which. */
async function untilOneEnds(parts) {
  const [name, { code, signal }] = await Promise.race(Object.entries(parts).map(async ([part, ended]) => [part, await ended]));
  throw new Trouble(
    `${name} ended unexpectedly (${signal ?? `exit ${code}`}). Everything is stopped; the logs are in .ebbmark/logs. Start again with: npm run up`,
  );
}

function alreadyRunning({ pid, port }) {
  return new Trouble(
    `Ebbmark is running from this folder already, at http://localhost:${port} (process ${pid}). Stop it with Ctrl-C there, or: kill ${pid}`,
  );
}

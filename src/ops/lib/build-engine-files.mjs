import { existsSync } from "node:fs";
import { join } from "node:path";
import { baseEnvironment } from "./environment.mjs";
import { root } from "./places.mjs";
import { lastWords } from "./scripts.mjs";
import { underLock } from "./single-start.mjs";
import { Trouble } from "./trouble.mjs";

/** Worker threads of the server by the variable that tells the server where they are. */
const threads = { EBBMARK_ENGINE_THREAD: "server-thread", EBBMARK_PASSWORD_THREAD: "password-thread" };

/**
 * Writes the engine as one file named by its hash, and each worker thread of the server as one file beside it.
 *
 * Returns  the paths of the threads by variable name
 */
export async function buildEngineFiles(processes, places, say) {
  return underLock(join(places.home, "engines.lock"), say, async () => {
    const env = { ...baseEnvironment(), EBBMARK_ENGINE_DIR: places.engines };
    const { code, output, logFile } = await processes.runToEnd(
      "build-engine",
      process.execPath,
      [join(root, "src/ops/build-engine.mjs")],
      { cwd: root, env },
    );
    if (code !== 0) throw new Trouble(`The engine could not be built: ${lastWords(output)} The whole output is in ${logFile}.`);
    return buildThreads(places.engines);
  });
}

async function buildThreads(folder) {
  const present = Object.entries(threads).filter(([, name]) => existsSync(join(root, `src/workers/${name}.ts`)));
  const { build } = await import("esbuild");
  await build({
    absWorkingDir: root,
    entryPoints: present.map(([, name]) => `src/workers/${name}.ts`),
    outdir: folder,
    outExtension: { ".js": ".mjs" },
    bundle: true,
    platform: "node",
    format: "esm",
    target: "node20",
    conditions: ["react-server"],
    // Packages in the older module format call `require` for what Node.js has built in.
    banner: { js: 'import { createRequire } from "node:module"; const require = createRequire(import.meta.url);' },
    logLevel: "silent",
  }).catch((error) => {
    throw new Trouble(`A worker thread could not be built: ${error.errors?.[0]?.text ?? error.message}`);
  });
  return Object.fromEntries(present.map(([variable, name]) => [variable, join(folder, `${name}.mjs`)]));
}

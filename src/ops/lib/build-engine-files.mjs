import { join } from "node:path";
import { baseEnvironment } from "./environment.mjs";
import { root } from "./places.mjs";
import { lastWords } from "./scripts.mjs";
import { underLock } from "./single-start.mjs";
import { Trouble } from "./trouble.mjs";

/** Worker threads of the server by the variable that tells the server where they are. */
export const threads = { EBBMARK_ENGINE_THREAD: "server-thread", EBBMARK_PASSWORD_THREAD: "password-thread" };

/**
 * Writes the engine as one file named by its hash, and each worker thread of the server as one file beside it.
 *
 * Returns  the paths of the threads by variable name
 */
export async function buildEngineFiles(processes, places, say) {
  const env = { ...baseEnvironment(), EBBMARK_ENGINE_DIR: places.engines };
  const run = async (name, what) => {
    const { code, output, logFile } = await processes.runToEnd(name, process.execPath, [join(root, `src/ops/${name}.mjs`)], {
      cwd: root,
      env,
    });
    if (code !== 0) throw new Trouble(`${what} could not be built: ${lastWords(output)} The whole output is in ${logFile}.`);
  };
  await underLock(join(places.home, "engines.lock"), say, async () => {
    await run("build-engine", "The engine");
    await run("bundle-threads", "The worker threads");
  });
  return Object.fromEntries(Object.entries(threads).map(([variable, name]) => [variable, join(places.engines, `${name}.mjs`)]));
}

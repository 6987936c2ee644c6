import { cpSync, existsSync, mkdirSync, readdirSync, renameSync, rmSync, statSync, utimesSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { baseEnvironment } from "./environment.mjs";
import { hashFiles } from "./hash-files.mjs";
import { home, root } from "./places.mjs";
import { lastWords } from "./scripts.mjs";
import { underLock } from "./single-start.mjs";
import { Trouble } from "./trouble.mjs";

const builtFrom = [
  "src",
  "db",
  "public",
  "fonts",
  "package.json",
  "package-lock.json",
  "next.config.mjs",
  "tsconfig.json",
  "tailwind.config.ts",
  "postcss.config.mjs",
];
const keptBuilds = 3;

/** What never reaches the product: tests, and the commands themselves. */
export function isOutsideBuild(file) {
  return /\.(test|bench)\.tsx?$|^src\/(ops|cli|verifier)\/|^db\/(seed|superuser)\//.test(file);
}

/**
 * Builds the product unless these very sources are built already. Each build is kept by the hash of its sources, so a running one is
 * never overwritten by a newer, and going back to a former state costs nothing.
 *
 * Returns  `{ server, say }`: the script that serves it
 */
export async function buildProduct(processes, places, say) {
  return underLock(join(home, "build.lock"), say, async () => {
    const hash = hashFiles(root, builtFrom, isOutsideBuild);
    const folder = join(places.builds, hash.slice(0, 16));
    const server = join(folder, "server.js");
    if (existsSync(server)) {
      utimesSync(folder, new Date(), new Date());
      return { server, say: "unchanged" };
    }
    say("Building the product. This takes a few minutes …");
    const { code, output, logFile } = await processes.runToEnd(
      "next-build",
      process.execPath,
      [join(root, "node_modules/next/dist/bin/next"), "build"],
      {
        cwd: root,
        env: { ...baseEnvironment(), NODE_ENV: "production" },
      },
    );
    if (code !== 0) throw new Trouble(`The product could not be built: ${lastWords(output)} The whole output is in ${logFile}.`);
    collect(folder);
    dropOldBuilds(places.builds);
    return { server, say: "built" };
  });
}

/** The standalone server lacks what a proxy would serve: static files and the public folder. It takes its place in one step. */
function collect(folder) {
  const standalone = join(root, ".next/standalone");
  if (!existsSync(join(standalone, "server.js")))
    throw new Trouble('The build made no standalone server: next.config.mjs must say output: "standalone".');
  cpSync(join(root, ".next/static"), join(standalone, ".next/static"), { recursive: true });
  if (existsSync(join(root, "public"))) cpSync(join(root, "public"), join(standalone, "public"), { recursive: true });
  writeFileSync(join(standalone, "built.json"), `${JSON.stringify({ node: process.version })}\n`);
  mkdirSync(join(folder, ".."), { recursive: true, mode: 0o700 });
  rmSync(folder, { recursive: true, force: true });
  renameSync(standalone, folder);
}

function dropOldBuilds(builds) {
  const byAge = readdirSync(builds)
    .map((name) => join(builds, name))
    .sort((a, b) => statSync(b).mtimeMs - statSync(a).mtimeMs);
  for (const folder of byAge.slice(keptBuilds)) rmSync(folder, { recursive: true, force: true });
}

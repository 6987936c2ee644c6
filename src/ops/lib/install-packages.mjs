import { existsSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { root } from "./places.mjs";
import { Trouble } from "./trouble.mjs";

/** Installs exactly the lock file with `npm ci`, unless that is what node_modules holds already. */
export async function installPackages(processes, say) {
  const wanted = readLock(join(root, "package-lock.json"));
  if (!wanted) throw new Trouble("package-lock.json is missing or damaged. Restore it: git checkout package-lock.json");
  if (matchesLock(wanted, readLock(join(root, "node_modules/.package-lock.json")))) return "as in the lock file";

  say("Installing packages from the lock file. This takes a few minutes the first time …");
  const { code, error, output, logFile } = await processes.runToEnd("npm-ci", "npm", ["ci", "--no-audit", "--no-fund"], {
    cwd: root,
    env: process.env,
  });
  if (error) throw new Trouble("npm is missing. Install npm 11 beside Node.js, then run the command again.");
  if (code !== 0) throw new Trouble(`npm ci failed: ${firstReason(output)} The whole output is in ${logFile}.`);
  return "installed";
}

/**
 * True when the packages that npm noted in node_modules at the end of its last full install are those of the lock file.
 * A package marked optional may be missing: it is for another system.
 */
export function matchesLock(wanted, installed) {
  if (!installed) return false;
  const missing = Object.entries(wanted.packages).filter(
    ([path, entry]) =>
      path !== "" && installed.packages[path]?.version !== entry.version && !(entry.optional && !installed.packages[path]),
  );
  const surplus = Object.keys(installed.packages).filter((path) => !wanted.packages[path]);
  return missing.length === 0 && surplus.length === 0;
}

function readLock(file) {
  if (!existsSync(file)) return undefined;
  try {
    const lock = JSON.parse(readFileSync(file, "utf8"));
    return lock.packages ? lock : undefined;
  } catch {
    return undefined;
  }
}

function firstReason(output) {
  const lines = output.split("\n").filter((line) => /^npm (error|ERR!)/.test(line));
  const words = lines
    .map((line) => line.replace(/^npm (error|ERR!)\s*/, "").trim())
    .filter((line) => line && !/^(code|errno|syscall|path|A complete log)/.test(line));
  if (/ENOSPC/.test(output)) return "no space is left on the disk.";
  return `${(words[0] ?? "no reason given").replace(/\.?$/, ".")}`;
}

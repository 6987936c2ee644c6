import { accessSync, constants } from "node:fs";
import { installDebianPackage } from "./debian-package.mjs";
import { Trouble } from "./trouble.mjs";

/** The browser for the tests: CHROMIUM_PATH, else Debian's, installed when missing. Returns its path. */
export async function findChromium(processes, say) {
  const chosen = process.env.CHROMIUM_PATH;
  if (chosen) {
    if (canRun(chosen)) return chosen;
    throw new Trouble(`CHROMIUM_PATH names ${chosen}, which cannot be run. Correct it, or unset it to use Debian's.`);
  }
  const debian = "/usr/bin/chromium";
  if (!canRun(debian)) await installDebianPackage(processes, { name: "chromium", what: "Chromium", say });
  return debian;
}

function canRun(file) {
  try {
    accessSync(file, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}

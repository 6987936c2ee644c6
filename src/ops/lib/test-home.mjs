import { chmodSync, existsSync, mkdtempSync, readdirSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fallbackFolder } from "./cluster-place.mjs";
import { home, makePlaces, placesOf } from "./places.mjs";
import { isAlive, processIdentity } from "./process-identity.mjs";
import { endLeftovers, readNote } from "./processes.mjs";

/**
 * Makes the home of one test run, named by its process, and a folder for what the tests write to the temporary folder.
 *
 * Returns  the places of the run, with `temporary`
 */
export function makeTestHome() {
  const places = placesOf(join(home, `test-${process.pid}`), join(home, "test-logs"));
  makePlaces(places);
  const temporary = mkdtempSync(join(tmpdir(), "ebbmark-test-"));
  chmodSync(temporary, 0o711); // the account of PostgreSQL passes through
  writeFileSync(
    join(places.home, "holder.json"),
    JSON.stringify({ pid: process.pid, identity: processIdentity(process.pid), temporary }),
  );
  return { ...places, temporary };
}

/** Ends what still runs in a home of a test run, then removes all of it. */
export async function removeTestHome(folder) {
  const temporary = readNote(join(folder, "holder.json"))?.temporary;
  await endLeftovers(join(folder, "run"));
  if (temporary && existsSync(temporary)) {
    for (const name of readdirSync(temporary)) await endLeftovers(join(temporary, name, "run"));
    rmSync(temporary, { recursive: true, force: true });
  }
  for (const path of [fallbackFolder(join(folder, "cluster")), folder]) rmSync(path, { recursive: true, force: true });
}

/** The homes of test runs that were killed: folders named test-PID whose process is gone. */
export function abandonedHomes(base = home) {
  if (!existsSync(base)) return [];
  return readdirSync(base)
    .filter((name) => /^test-\d+$/.test(name))
    .map((name) => join(base, name))
    .filter((folder) => {
      const holder = readNote(join(folder, "holder.json"));
      return !holder || !isAlive(holder);
    });
}

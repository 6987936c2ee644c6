import { chmodSync, mkdirSync } from "node:fs";
import { dirname, join, resolve } from "node:path";
import { fileURLToPath } from "node:url";

/** The checkout that this file belongs to, as an absolute path. */
export const root = resolve(dirname(fileURLToPath(import.meta.url)), "../../..");

/** Private run-time state of the checkout. */
export const home = join(root, ".ebbmark");

/**
 * The folders of one installation. A test run has a home of its own below the checkout's, which is removed at its end; its logs stay.
 * Builds are named by their hash, so all share them.
 */
export function placesOf(base, logs = join(base, "logs")) {
  return {
    home: base,
    cluster: join(base, "cluster"),
    engines: join(base, "engines"),
    builds: join(home, "builds"),
    mail: join(base, "mail"),
    storage: join(base, "storage"),
    logs,
    run: join(base, "run"),
    screens: join(home, "screens"),
  };
}

/** Makes the folders that every command writes to. As root the home lets the account of PostgreSQL pass through, and nothing more. */
export function makePlaces(places) {
  mkdirSync(home, { recursive: true });
  if (process.getuid?.() === 0) {
    chmodSync(home, 0o711);
    mkdirSync(places.home, { recursive: true });
    chmodSync(places.home, 0o711);
  } else {
    chmodSync(home, 0o700);
    mkdirSync(places.home, { recursive: true, mode: 0o700 });
  }
  for (const folder of [places.logs, places.run, places.engines, places.mail, places.storage]) {
    mkdirSync(folder, { recursive: true, mode: 0o700 });
  }
}

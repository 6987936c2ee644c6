import { execFileSync } from "node:child_process";
import { accessSync, constants, existsSync, mkdirSync, readFileSync, readdirSync, rmSync, writeFileSync } from "node:fs";
import { dirname, join } from "node:path";
import { installDebianPackage } from "./debian-package.mjs";
import { Trouble } from "./trouble.mjs";

/** The oldest server that the migrations are tested with. */
const lowestMajor = 15;

/**
 * Every server that can be used, installed from Debian when there is none.
 *
 * Returns  `{ bin, major }[]`, newest first
 */
export async function findOrInstallPostgres(processes, { say }) {
  const found = usable(listPostgres());
  if (found.length > 0) return found;
  await withoutDebianCluster(() => installDebianPackage(processes, { name: "postgresql", what: "PostgreSQL", say }));
  const installed = usable(listPostgres());
  if (installed.length === 0) {
    throw new Trouble(
      `Debian's PostgreSQL is older than ${lowestMajor}. Install PostgreSQL ${lowestMajor} or newer, then run the command again.`,
    );
  }
  return installed;
}

const usable = (servers) => servers.filter(({ major }) => major >= lowestMajor);

/** Every installed server, newest first: Debian's folders, then the one on PATH. `psql` alone is only a client. */
export function listPostgres(debian = "/usr/lib/postgresql", path = process.env.PATH ?? "") {
  const versions = existsSync(debian) ? readdirSync(debian).map((version) => join(debian, version, "bin")) : [];
  const bins = [...new Set([...versions, ...path.split(":").filter(Boolean)])].filter((bin) =>
    ["initdb", "postgres", "pg_controldata"].every((name) => canRun(join(bin, name))),
  );
  return bins
    .map((bin) => ({ bin, major: majorOf(bin) }))
    .filter(({ major }) => major > 0)
    .sort((a, b) => b.major - a.major);
}

/** The newest server, or the one of the major version that made the cluster in the data folder. */
export function choosePostgres(servers, dataFolder) {
  const versionFile = join(dataFolder, "PG_VERSION");
  if (!existsSync(versionFile)) return servers[0];
  const needed = Number.parseInt(readFileSync(versionFile, "utf8"), 10);
  // A file that holds no number is damage, which the check of the data folder reports in its own words.
  const match = Number.isNaN(needed) ? servers[0] : servers.find(({ major }) => major === needed);
  if (!match) {
    throw new Trouble(
      `The database in ${dataFolder} was made by PostgreSQL ${needed}, which is not installed: apt-get install postgresql-${needed}`,
    );
  }
  return match;
}

function majorOf(bin) {
  try {
    const text = execFileSync(join(bin, "postgres"), ["--version"], { encoding: "utf8", cwd: dirname(bin) });
    return Number(/\(PostgreSQL\) (\d+)/.exec(text)?.[1] ?? 0);
  } catch {
    return 0;
  }
}

function canRun(file) {
  try {
    accessSync(file, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}

/** Keeps Debian from making and starting a cluster of its own on port 5432 while the package installs. */
async function withoutDebianCluster(install) {
  const folder = "/etc/postgresql-common/createcluster.d";
  const file = join(folder, "ebbmark.conf");
  if (process.getuid?.() !== 0) return install();
  mkdirSync(folder, { recursive: true });
  writeFileSync(file, "create_main_cluster = false\n");
  try {
    return await install();
  } finally {
    rmSync(file, { force: true });
  }
}

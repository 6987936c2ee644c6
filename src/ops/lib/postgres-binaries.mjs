import { accessSync, constants, existsSync, readFileSync, readdirSync } from "node:fs";
import { join } from "node:path";
import { installDebianPackage } from "./debian-package.mjs";
import { Trouble } from "./trouble.mjs";

/** The oldest server that the migrations are tested with. */
const lowestMajor = 15;

/** Keeps Debian from making and starting a cluster of its own on port 5432 while the package installs. */
const withoutDebianCluster = {
  before:
    "mkdir -p /etc/postgresql-common/createcluster.d && echo create_main_cluster = false > /etc/postgresql-common/createcluster.d/ebbmark.conf",
  after: "rm -f /etc/postgresql-common/createcluster.d/ebbmark.conf",
};

/**
 * Every server that can be used, installed from Debian when there is none.
 *
 * Returns  `{ bin, major }[]`, newest first
 */
export async function findOrInstallPostgres(processes, { say }) {
  const found = await listPostgres(processes);
  if (found.length > 0) return found;
  await installDebianPackage(processes, { name: "postgresql", what: "PostgreSQL", say, ...withoutDebianCluster });
  const installed = await listPostgres(processes);
  if (installed.length === 0) {
    throw new Trouble(
      `Debian's PostgreSQL is older than ${lowestMajor}. Install PostgreSQL ${lowestMajor} or newer, then run the command again.`,
    );
  }
  return installed;
}

/**
 * Every installed server, newest first: Debian's folders, which are named by the version, then those on PATH, which are asked for it.
 * `psql` alone is only a client.
 */
async function listPostgres(processes) {
  const debian = "/usr/lib/postgresql";
  const known = existsSync(debian)
    ? readdirSync(debian).map((version) => ({ bin: join(debian, version, "bin"), major: Number.parseInt(version, 10) }))
    : [];
  const servers = known.filter(({ bin }) => isServer(bin));
  for (const bin of (process.env.PATH ?? "").split(":").filter((folder) => folder && isServer(folder))) {
    const { output } = await processes.runToEnd("postgres-version", join(bin, "postgres"), ["--version"], { cwd: "/" });
    servers.push({ bin, major: Number(/\(PostgreSQL\) (\d+)/.exec(output)?.[1] ?? 0) });
  }
  return servers.filter(({ major }) => major >= lowestMajor).sort((a, b) => b.major - a.major);
}

function isServer(bin) {
  return ["initdb", "postgres", "pg_controldata"].every((name) => canRun(join(bin, name)));
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

function canRun(file) {
  try {
    accessSync(file, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}

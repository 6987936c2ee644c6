import {
  chmodSync,
  chownSync,
  existsSync,
  mkdirSync,
  readFileSync,
  readdirSync,
  renameSync,
  rmSync,
  statSync,
  writeFileSync,
} from "node:fs";
import { join } from "node:path";
import { setTimeout as sleep } from "node:timers/promises";
import { freePort } from "./free-port.mjs";
import { shellWord } from "./shell-word.mjs";
import { Trouble } from "./trouble.mjs";

const startPatienceMs = 60_000;

/** Makes an empty cluster. It takes its final name only when it is whole, so a broken-off start leaves nothing half-made behind. */
export async function initCluster(processes, { bin, dataFolder, account, superuserPassword }) {
  const draft = `${dataFolder}.new`;
  const passwordFile = `${dataFolder}.password`;
  rmSync(draft, { recursive: true, force: true });
  mkdirSync(draft, { recursive: true, mode: 0o700 });
  writeFileSync(passwordFile, superuserPassword, { mode: 0o600 });
  if (account.uid !== undefined) for (const path of [draft, passwordFile]) chownSync(path, account.uid, account.gid);

  const settings = [
    "-U",
    "postgres",
    `--pwfile=${passwordFile}`,
    "--auth=scram-sha-256",
    "-E",
    "UTF8",
    "--locale=C.UTF-8",
    "--data-checksums",
  ];
  const { code, output, logFile } = await processes.runToEnd("initdb", join(bin, "initdb"), ["-D", draft, ...settings], {
    ...account,
    cwd: "/",
    env: plainEnvironment(),
  });
  rmSync(passwordFile, { force: true });
  if (code !== 0) {
    if (/No space left on device|could not extend file/i.test(output))
      throw Object.assign(new Error("initdb"), { code: "ENOSPC", path: dataFolder });
    const reason = output.split("\n").findLast((line) => /error|fatal|could not/i.test(line)) ?? "no reason given";
    throw new Trouble(`The database could not be made: ${reason.trim()}. The whole output is in ${logFile}.`);
  }
  renameSync(draft, dataFolder);
}

/** Refuses a data folder that is not a whole cluster, before the server meets it. */
export async function checkCluster(processes, { bin, dataFolder, account }) {
  const owner = statSync(dataFolder).uid;
  if (account.uid === undefined && owner !== process.getuid?.()) {
    throw new Trouble(
      `The database in ${dataFolder} belongs to another user (${owner}). Run the command as that user, or as root.`,
    );
  }
  const missing = ["PG_VERSION", "global/pg_control", "base", "pg_wal", "pg_hba.conf", "postgresql.conf"].find(
    (part) => !existsSync(join(dataFolder, part)),
  );
  if (missing) throw damaged(dataFolder, `${missing} is missing`);
  const version = readFileSync(join(dataFolder, "PG_VERSION"), "utf8");
  if (!/^\d+\n?$/.test(version)) throw damaged(dataFolder, "PG_VERSION holds no version");
  const { code, output } = await processes.runToEnd("pg-controldata", join(bin, "pg_controldata"), ["-D", dataFolder], {
    ...account,
    cwd: "/",
    env: plainEnvironment(),
  });
  if (code !== 0 || /CRC checksum does not match/i.test(output)) throw damaged(dataFolder, "its control file is unreadable");
  chmodSync(dataFolder, 0o700);
}

/**
 * Starts the server on 127.0.0.1 at a free port and waits until it takes connections. No socket in the file system: nothing else on the
 * machine shares it, and its path cannot be too long.
 *
 * throwAway  true for tests: nothing is flushed to the disk
 * Returns    `{ port, ended }`
 */
export async function startCluster(processes, { bin, dataFolder, account, throwAway = false }) {
  const deadline = performance.now() + startPatienceMs;
  for (;;) {
    const port = await freePort();
    const settings = {
      listen_addresses: "127.0.0.1",
      port,
      unix_socket_directories: "",
      logging_collector: "off",
      ...(throwAway ? { fsync: "off", full_page_writes: "off", synchronous_commit: "off" } : {}),
    };
    const args = Object.entries(settings).flatMap(([name, value]) => ["-c", `${name}=${value}`]);
    const { child, ended, logFile } = processes.start("postgres", join(bin, "postgres"), ["-D", dataFolder, ...args], {
      ...account,
      cwd: "/",
      env: plainEnvironment(),
      stopSignal: "SIGINT", // PostgreSQL's fast shutdown: sessions are ended, everything is written
      toGroup: false,
      patienceMs: 30_000,
    });
    const end = await Promise.race([ended, untilReady(dataFolder, child.pid, deadline)]);
    if (end === "ready") return { port, ended };
    if (end === "late")
      throw new Trouble(`PostgreSQL did not take connections within ${startPatienceMs / 1000} s. Its log: ${logFile}`);

    const reason = reasonIn(logFile);
    // After a kill -9 its orphans hold lock file and shared memory for a moment; and another program may be quicker at the free port.
    const passing =
      /lock file .*already exists|shared memory block .*in use|could not bind|Address already in use|could not create any TCP/i.test(
        reason.all,
      );
    if (/No space left on device/i.test(reason.all))
      throw Object.assign(new Error(reason.last), { code: "ENOSPC", path: dataFolder });
    if (!passing || performance.now() > deadline) {
      throw new Trouble(
        `PostgreSQL did not start: ${reason.last} If the data folder ${dataFolder} is damaged, restore a backup, or begin empty: mv ${shellWord(dataFolder)} ${shellWord(`${dataFolder}.damaged`)}`,
      );
    }
    await sleep(500);
  }
}

export function clusterExists(dataFolder) {
  return existsSync(dataFolder) && readdirSync(dataFolder).length > 0;
}

function damaged(dataFolder, what) {
  return new Trouble(
    `The database in ${dataFolder} is damaged (${what}). Restore a backup, or begin empty: mv ${shellWord(dataFolder)} ${shellWord(`${dataFolder}.damaged`)}`,
  );
}

/** The server writes its state into the last line of postmaster.pid, and its process number into the first. */
async function untilReady(dataFolder, pid, deadline) {
  while (performance.now() < deadline) {
    await sleep(50);
    const lines = readIfThere(join(dataFolder, "postmaster.pid")).trimEnd().split("\n");
    if (Number(lines[0]) === pid && lines.at(-1).trim() === "ready") return "ready";
  }
  return "late";
}

function readIfThere(file) {
  try {
    return readFileSync(file, "utf8");
  } catch {
    return "";
  }
}

function reasonIn(logFile) {
  const all = readIfThere(logFile);
  const last = all.split("\n").findLast((line) => /FATAL|PANIC/.test(line)) ?? "no reason given";
  return { all, last: `${last.replace(/^.*?(FATAL|PANIC):\s*/, "").replace(/\.?$/, ".")}` };
}

function plainEnvironment() {
  return { PATH: process.env.PATH, LC_ALL: "C.UTF-8", TZ: "UTC" };
}

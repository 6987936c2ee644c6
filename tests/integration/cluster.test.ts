import { execFileSync } from "node:child_process";
import { chmodSync, existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import pg from "pg";
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from "vitest";
import { databaseUrl } from "@/ops/lib/environment.mjs";
import { openDatabase } from "@/ops/lib/open-database.mjs";
import { processIdentity } from "@/ops/lib/process-identity.mjs";
import { createProcesses, endLeftovers } from "@/ops/lib/processes.mjs";

/** Starts and stops real clusters in folders that are removed afterwards. One is made, and copied for each test that only needs to have one. */
type Places = { home: string; cluster: string; run: string; logs: string };

let made: Places;
let places: Places;
let processes: ReturnType<typeof createProcesses>;

const quiet = { say: () => {}, throwAway: true };

function newPlaces(): Places {
  const home = mkdtempSync(join(tmpdir(), "ebbmark-cluster-"));
  chmodSync(home, 0o711);
  return { home, cluster: join(home, "cluster"), run: join(home, "run"), logs: join(home, "logs") };
}

/** Owners and modes kept: the server is particular about both. */
function copyMade(): void {
  execFileSync("cp", ["-a", made.cluster, join(made.home, "secrets.json"), places.home]);
}

beforeAll(async () => {
  made = newPlaces();
  const makers = createProcesses(made);
  await openDatabase(makers, made, quiet);
  await makers.stopAll();
});
afterAll(() => rmSync(made.home, { recursive: true, force: true }));

beforeEach(() => {
  places = newPlaces();
  processes = createProcesses(places);
});

afterEach(async () => {
  await processes.stopAll();
  rmSync(places.home, { recursive: true, force: true });
});

async function ask(server: { port: number; secrets: Record<string, string> }, sql: string): Promise<unknown[]> {
  const password = server.secrets.superuserPassword as string;
  const client = new pg.Client(databaseUrl({ user: "postgres", password, port: server.port, database: "postgres" }));
  await client.connect();
  try {
    return (await client.query(sql)).rows;
  } finally {
    await client.end();
  }
}

const postmasterPid = () => Number(readFileSync(join(places.cluster, "postmaster.pid"), "utf8").split("\n")[0]);

describe("a cluster of the project's own", () => {
  it("is made with checksums, listens on the loopback only, and asks for a password", async () => {
    const server = await openDatabase(processes, places, quiet);
    expect(
      await ask(server, "select current_setting('listen_addresses') as at, current_setting('data_checksums') as sums"),
    ).toEqual([{ at: "127.0.0.1", sums: "on" }]);
    await expect(ask({ ...server, secrets: { superuserPassword: "guess" } }, "select 1")).rejects.toThrow(
      /password authentication failed/,
    );
  });

  it("keeps its data and its passwords over a stop and a second start", async () => {
    const first = await openDatabase(processes, places, quiet);
    await ask(first, "create table kept as select 7 as n");
    await processes.stopAll();
    expect(existsSync(join(places.cluster, "postmaster.pid"))).toBe(false);

    processes = createProcesses(places);
    const second = await openDatabase(processes, places, quiet);
    expect(await ask(second, "select n from kept")).toEqual([{ n: 7 }]);
    expect(second.secrets).toEqual(first.secrets);
  });

  it("starts again after the server was killed, with what had been written", async () => {
    copyMade();
    const first = await openDatabase(processes, places, { ...quiet, throwAway: false });
    await ask(first, "create table kept as select 7 as n");
    process.kill(postmasterPid(), "SIGKILL");
    await first.ended;

    const second = await openDatabase(processes, places, quiet);
    expect(await ask(second, "select n from kept")).toEqual([{ n: 7 }]);
  });

  it("ends a server that a killed start left running, and starts its own", async () => {
    copyMade();
    await openDatabase(processes, places, quiet);
    const left = postmasterPid();
    expect(processIdentity(left)).toBeDefined();
    // What a start finds that follows a kill -9: the note of the running server, and no one who holds it.
    expect(await endLeftovers(places.run)).toEqual(["postgres"]);
    expect(processIdentity(left)).toBeUndefined();
    const server = await openDatabase(processes, places, quiet);
    expect(await ask(server, "select 1 as one")).toEqual([{ one: 1 }]);
  });

  it("never ends a process that only bears the number of an old one", async () => {
    writeFileSync(
      join(places.run, "web.json"),
      JSON.stringify({
        name: "web",
        pid: process.pid,
        identity: "another boot/1",
        stopSignal: "SIGTERM",
        toGroup: false,
        patienceMs: 1,
      }),
    );
    expect(await endLeftovers(places.run)).toEqual([]);
  });
});

describe("a damaged data folder", () => {
  it.each([
    ["without its version", () => rmSync(join(places.cluster, "PG_VERSION")), /is damaged \(PG_VERSION is missing\).*mv /],
    [
      "without its control file",
      () => rmSync(join(places.cluster, "global/pg_control")),
      /is damaged \(global\/pg_control is missing\).*mv /,
    ],
    [
      "with nonsense for a control file",
      () => writeFileSync(join(places.cluster, "global/pg_control"), Buffer.alloc(8192, 7)),
      /is damaged \(its control file is unreadable\).*mv /,
    ],
    [
      "with nonsense for a version",
      () => writeFileSync(join(places.cluster, "PG_VERSION"), "x\n"),
      /is damaged \(PG_VERSION holds no version\).*mv /,
    ],
    [
      "with a broken setting",
      () => writeFileSync(join(places.cluster, "postgresql.conf"), "port = = 1\n"),
      /PostgreSQL did not start: .+ mv /,
    ],
    [
      "without its write-ahead log",
      () => rmSync(join(places.cluster, "pg_wal"), { recursive: true }),
      /is damaged \(pg_wal is missing\).*mv /,
    ],
  ])("%s is refused in one line that says what to do", async (_, damage, message) => {
    copyMade();
    damage();
    const refusal = await openDatabase(processes, places, quiet).then(
      () => undefined,
      (error: Error) => error,
    );
    expect(refusal?.name).toBe("Trouble");
    expect(refusal?.message).toMatch(message);
    expect(refusal?.message).not.toContain("\n");
  });

  it("is refused when it holds only strange files, which stay untouched", async () => {
    mkdirSync(places.cluster);
    writeFileSync(join(places.cluster, "letter.txt"), "mine");
    writeFileSync(join(places.home, "secrets.json"), "{}");
    await expect(openDatabase(processes, places, quiet)).rejects.toThrow(/PG_VERSION is missing/);
    expect(readFileSync(join(places.cluster, "letter.txt"), "utf8")).toBe("mine");
  });

  it("is not mistaken for a new one when only the secrets are lost", async () => {
    copyMade();
    rmSync(join(places.home, "secrets.json"));
    await expect(openDatabase(processes, places, quiet)).rejects.toThrow(
      /secrets\.json is missing, but the database that needs it exists/,
    );
  });
});

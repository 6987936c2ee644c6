import { existsSync, mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { setTimeout as sleep } from "node:timers/promises";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { isAlive, processIdentity } from "./process-identity.mjs";
import { createProcesses, endLeftovers } from "./processes.mjs";

let base: string;
let places: { run: string; logs: string };
beforeEach(() => {
  base = mkdtempSync(join(tmpdir(), "ebbmark-processes-"));
  places = { run: join(base, "run"), logs: join(base, "logs") };
});
afterEach(() => rmSync(base, { recursive: true, force: true }));

/** A shell whose child outlives a signal to the shell alone: what a tool's own children do. */
const withChild = ["-c", "sleep 60 & echo $!; wait"];
const deaf = ["-c", "trap '' TERM; echo ready; while :; do sleep 0.1; done"];
const env = { PATH: process.env.PATH };

async function printed(logFile: string): Promise<string> {
  for (let i = 0; i < 100; i++, await sleep(20)) {
    const text = existsSync(logFile) ? readFileSync(logFile, "utf8").trim() : "";
    if (text) return text;
  }
  throw new Error("nothing was printed");
}

describe("createProcesses", () => {
  it("ends a process with its children, and removes its note", async () => {
    const processes = createProcesses(places);
    const { child, logFile } = processes.start("tool", "sh", withChild, { env });
    const grandchild = Number(await printed(logFile));
    expect(existsSync(join(places.run, "tool.json"))).toBe(true);
    await processes.stopAll();
    expect([processIdentity(child.pid), processIdentity(grandchild)]).toEqual([undefined, undefined]);
    expect(existsSync(join(places.run, "tool.json"))).toBe(false);
  });

  it("kills one that does not listen", async () => {
    const processes = createProcesses(places);
    const { logFile, ended } = processes.start("deaf", "sh", deaf, { env, patienceMs: 200 });
    await printed(logFile);
    await processes.stopAll();
    expect(await ended).toMatchObject({ signal: "SIGKILL" });
  });

  it("starts nothing once it is stopping", async () => {
    const processes = createProcesses(places);
    await processes.stopAll();
    expect(() => processes.start("late", "sh", ["-c", "true"], { env })).toThrow("Stopping.");
  });

  it("gives exit code and output of a tool, and says when there is no such program", async () => {
    const processes = createProcesses(places);
    expect(await processes.runToEnd("tool", "sh", ["-c", "echo out; echo err >&2; exit 3"], { env })).toMatchObject({
      code: 3,
      output: "out\nerr\n",
    });
    expect((await processes.runToEnd("none", "/no/such/program", [], { env })).error).toMatchObject({ code: "ENOENT" });
  });
});

describe("endLeftovers", () => {
  it("ends what runs by its note, and forgets what has ended", async () => {
    const { child, logFile, note } = createProcesses(places).start("tool", "sh", withChild, { env });
    await printed(logFile);
    expect(isAlive(note)).toBe(true);
    expect(await endLeftovers(places.run)).toEqual(["tool"]);
    expect(processIdentity(child.pid)).toBeUndefined();
    expect(await endLeftovers(places.run)).toEqual([]);
  });
});

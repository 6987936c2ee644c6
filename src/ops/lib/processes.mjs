import { spawn } from "node:child_process";
import {
  closeSync,
  existsSync,
  mkdirSync,
  openSync,
  readFileSync,
  readdirSync,
  renameSync,
  rmSync,
  writeFileSync,
} from "node:fs";
import { join } from "node:path";
import { setTimeout as sleep } from "node:timers/promises";
import { isAlive, processIdentity } from "./process-identity.mjs";
import { Trouble } from "./trouble.mjs";

/**
 * @typedef {{ env?: Record<string, string | undefined>, cwd?: string, uid?: number, gid?: number, stdio?: any, ipc?: boolean,
 *   stopSignal?: string, toGroup?: boolean, patienceMs?: number }} StartOptions
 */

/**
 * Starts processes, each in a group of its own so that a Ctrl-C in the terminal reaches only us, and ends them in reverse order.
 * Every one leaves a note in the run folder until it has ended: after a kill -9 the next start finds and ends what was left.
 */
export function createProcesses({ run, logs }) {
  mkdirSync(run, { recursive: true, mode: 0o700 });
  mkdirSync(logs, { recursive: true, mode: 0o700 });
  /** @type {Map<string, any>} */
  const running = new Map();
  let closing = false;

  /**
   * Starts one process.
   *
   * name        of the note and, unless `stdio` says otherwise, of the log file
   * ipc         opens a channel for messages
   * stopSignal  what asks it to end; `toGroup: false` sends it to the process alone (PostgreSQL tells its own children)
   * Returns     the process, with `ended`: a promise of `{ code, signal }`
   *
   * @param {string} name @param {string} command @param {string[]} args @param {StartOptions} options
   */
  function start(
    name,
    command,
    args,
    { env, cwd, uid, gid, stdio, ipc = false, stopSignal = "SIGTERM", toGroup = true, patienceMs = 10_000 } = {},
  ) {
    if (closing) throw new Trouble("Stopping.");
    const logFile = join(logs, `${name}.log`);
    const log = stdio ? undefined : openLog(logFile);
    /** @type {import("node:child_process").ChildProcess} */
    const child = spawn(command, args, {
      env,
      cwd,
      uid,
      gid,
      detached: true,
      stdio: stdio ?? ["ignore", log, log, ...(ipc ? ["ipc"] : [])],
    });
    if (log !== undefined) closeSync(log);
    const note = { name, pid: child.pid, identity: child.pid && processIdentity(child.pid), stopSignal, toGroup, patienceMs };
    const noteFile = join(run, `${name}.json`);
    if (child.pid) writeFileSync(noteFile, JSON.stringify(note), { mode: 0o600 });
    const ended = new Promise((done) => {
      child.once("error", (error) => done({ code: null, signal: null, error }));
      child.once("exit", (code, signal) => done({ code, signal }));
    }).then((end) => {
      running.delete(name);
      rmSync(noteFile, { force: true });
      return end;
    });
    const entry = { name, child, note, ended, logFile };
    running.set(name, entry);
    return entry;
  }

  /**
   * Runs a process to its end and returns `{ code, signal, output }`; the output is in the log as well.
   *
   * @param {string} name @param {string} command @param {string[]} args @param {StartOptions} options
   */
  async function runToEnd(name, command, args, options = {}) {
    const { ended, logFile } = start(name, command, args, options);
    const end = await ended;
    await unlessStopping();
    return { ...end, output: options.stdio || !existsSync(logFile) ? "" : readFileSync(logFile, "utf8"), logFile };
  }

  /** Goes on at once, or never: whoever is stopping us ends the program, and nothing that follows may happen. */
  async function unlessStopping() {
    if (closing) await new Promise(() => {});
  }

  async function stopAll() {
    closing = true;
    for (const entry of [...running.values()].reverse()) await endProcess(entry.note);
    await Promise.all([...running.values()].map((entry) => entry.ended));
  }

  return { start, runToEnd, unlessStopping, stopAll, stopNow: () => [...running.values()].forEach(({ note }) => killHard(note)) };
}

/** Ends what an earlier start left behind. Only a process that is still the very one of the note is touched. */
export async function endLeftovers(run) {
  const ended = [];
  for (const file of existsSync(run) ? readdirSync(run).filter((name) => name.endsWith(".json")) : []) {
    const note = readNote(join(run, file));
    if (note && isAlive(note)) {
      await endProcess(note);
      ended.push(note.name);
    }
    rmSync(join(run, file), { force: true });
  }
  return ended;
}

export function readNote(file) {
  try {
    return JSON.parse(readFileSync(file, "utf8"));
  } catch {
    return undefined; // cut short by a kill -9, or gone
  }
}

async function endProcess(note) {
  if (isAlive(note)) send(note, note.stopSignal);
  for (let waitedMs = 0; isAlive(note) && waitedMs < note.patienceMs; waitedMs += 50) await sleep(50);
  killHard(note);
  for (let waitedMs = 0; isAlive(note) && waitedMs < 5000; waitedMs += 50) await sleep(50);
}

/** The group may outlive its first process (a tool's own children), so it is always told. */
function killHard(note) {
  if (note.toGroup || isAlive(note)) send(note, note.toGroup ? "SIGKILL" : "SIGQUIT");
}

function send(note, signal) {
  try {
    process.kill(note.toGroup ? -note.pid : note.pid, signal);
  } catch (error) {
    if (error.code === "EPERM") {
      throw new Trouble(
        `Process ${note.pid} (${note.name}) of an earlier start belongs to another user: stop it with: sudo kill ${note.pid}`,
      );
    }
  }
}

/** Each start has a log of its own; the one before is kept. */
function openLog(file) {
  if (existsSync(file)) renameSync(file, `${file}.1`);
  return openSync(file, "a", 0o600);
}

import { appendFileSync } from "node:fs";
import { join } from "node:path";
import { createProcesses } from "./processes.mjs";
import { onStopSignals } from "./stop-signals.mjs";
import { troubleLine } from "./trouble.mjs";

const say = (line) => process.stdout.write(`${line}\n`);

/**
 * Runs a whole command: hands it what starts processes, ends every one of them however the command ends, and prints a failure as one line.
 *
 * places    folders of the installation
 * work      gets `{ processes, say }` and returns the exit code
 * cleanUp   runs last, once, after all processes have ended
 */
export async function runCommand({ places, work, cleanUp = () => {} }) {
  outliveTerminal();
  const processes = createProcesses(places);
  const stop = async () => {
    await processes.stopAll();
    await cleanUp();
  };
  const signals = onStopSignals({ stop, stopNow: processes.stopNow, say });
  let exitCode = 1;
  try {
    exitCode = await work({ processes, say });
  } catch (error) {
    if (signals.stopping) return; // the signal's own end follows
    report(error, places);
  }
  if (signals.stopping) return;
  try {
    await stop();
  } catch (error) {
    report(error, places);
    exitCode = 1;
  }
  if (!signals.stopping) process.exit(exitCode);
}

/** A closed terminal refuses our last words; without a listener that refusal would end us before the rest is ended. */
function outliveTerminal() {
  for (const stream of [process.stdout, process.stderr]) stream.on("error", () => {});
}

/** Prints what went wrong before there was anything to end, and ends the program. */
export function refuse(error) {
  process.stderr.write(`ebbmark: ${troubleLine(error).line}\n`);
  process.exit(1);
}

function report(error, { logs }) {
  const { line, expected } = troubleLine(error);
  process.stderr.write(`ebbmark: ${line}\n`);
  if (expected) return;
  try {
    appendFileSync(join(logs, "failures.log"), `${new Date().toISOString()} ${error?.stack ?? error}\n`, { mode: 0o600 });
    process.stderr.write(`ebbmark: The details are in ${join(logs, "failures.log")}.\n`);
  } catch {
    process.stderr.write(`${error?.stack ?? error}\n`);
  }
}

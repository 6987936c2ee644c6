import { join } from "node:path";
import { baseEnvironment } from "./environment.mjs";
import { root } from "./places.mjs";
import { Trouble } from "./trouble.mjs";

/** How a TypeScript entry point is run: in one process, with server modules allowed as in the web server. */
export function scriptArguments(file) {
  return ["--conditions=react-server", "--import", "tsx", join(root, file)];
}

/** Runs a TypeScript entry point to its end. Its last line on failure becomes ours. Returns all that it printed. */
export async function runScript(processes, name, file, env) {
  const { code, output, logFile } = await processes.runToEnd(name, process.execPath, scriptArguments(file), {
    cwd: root,
    env: { ...baseEnvironment(), ...env },
  });
  if (code === 0) return output;
  throw new Trouble(`${name} failed: ${lastWords(output)} The whole output is in ${logFile}.`);
}

/**
 * The line of a tool's output that says why it failed: the first complaint of a compiler, else the last error with a name, else the last
 * line that is neither stack nor bare brace.
 */
export function lastWords(output) {
  const lines = output.split("\n").map((line) => line.trim());
  const line =
    lines.find((text) => /\bERROR: |^Type error: |^Module not found: |\berror TS\d+/.test(text)) ??
    lines.findLast((text) => /^(\w+: )?\w*Error\b/.test(text)) ??
    lines.findLast((text) => text && !/^(at |Node\.js v|[{}\])]+,?$)/.test(text));
  return (line ?? "no reason given").replace(/[.:]?$/, ".");
}

/**
 * The last line of an output that is a JSON object holding `member`.
 *
 * Returns  undefined when there is none
 */
export function lastJsonLine(output, member) {
  for (const line of output.split("\n").reverse()) {
    if (!line.startsWith("{")) continue;
    try {
      const value = JSON.parse(line);
      if (value[member] !== undefined) return value;
    } catch {
      // a line that only looks like it
    }
  }
  return undefined;
}

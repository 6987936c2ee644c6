import { existsSync } from "node:fs";
import { Trouble } from "./trouble.mjs";

/**
 * Installs one Debian package as root. Without root, or without apt, it stops with the one command to run.
 *
 * name           of the package
 * what           the program in words
 * before, after  shell commands around the installation; `after` runs however it ends
 */
export async function installDebianPackage(processes, { name, what, say, before = "true", after = "true" }) {
  const command = `apt-get update && apt-get install -y --no-install-recommends ${name}`;
  if (!existsSync("/usr/bin/apt-get")) {
    throw new Trouble(
      `${what} is not installed, and this system has no apt-get. Install ${what} with its own package manager, then run the command again.`,
    );
  }
  if (process.getuid?.() !== 0) {
    throw new Trouble(`${what} is not installed. Install it, then run the command again: sudo sh -c '${command}'`);
  }
  say(`Installing ${what} from Debian …`);
  // Packages that an earlier, broken-off installation left half done would make apt-get refuse.
  const script = `trap '${after}' EXIT; trap 'exit 143' TERM; ${before} && dpkg --configure -a && ${command}`;
  const { code, output, logFile } = await processes.runToEnd(`apt-${name}`, "sh", ["-c", script], {
    env: { ...process.env, DEBIAN_FRONTEND: "noninteractive" },
    // The signal is for the shell alone, which lets the package manager finish: breaking it off would leave the system half configured.
    toGroup: false,
    patienceMs: 180_000,
  });
  if (code !== 0) {
    const reason = output.split("\n").findLast((line) => line.startsWith("E:")) ?? "E: no reason given";
    throw new Trouble(`${what} could not be installed: ${reason.slice(2).trim()} The whole output is in ${logFile}.`);
  }
}

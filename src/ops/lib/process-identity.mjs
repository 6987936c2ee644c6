import { execFileSync } from "node:child_process";
import { existsSync, readFileSync } from "node:fs";

/**
 * What tells one process from a later one that was given the same number: the boot and the tick it started at.
 *
 * Returns  undefined when no such process lives (a zombie counts as dead)
 */
export function processIdentity(pid) {
  if (existsSync("/proc/self/stat")) return fromProc(pid);
  try {
    return (
      execFileSync("ps", ["-o", "lstart=", "-p", String(pid)], {
        encoding: "utf8",
        stdio: ["ignore", "pipe", "ignore"],
      }).trim() || undefined
    );
  } catch {
    return undefined;
  }
}

export function isAlive({ pid, identity }) {
  return identity !== undefined && processIdentity(pid) === identity;
}

function fromProc(pid) {
  try {
    // The name in parentheses may hold spaces; state and the start tick (fields 3 and 22 of proc(5)) follow the last one.
    const fields = readFileSync(`/proc/${pid}/stat`, "utf8")
      .replace(/^.*\) /s, "")
      .split(" ");
    if (fields[0] === "Z" || fields[0] === "X") return undefined;
    return `${readFileSync("/proc/sys/kernel/random/boot_id", "utf8").trim()}/${fields[19]}`;
  } catch {
    return undefined;
  }
}

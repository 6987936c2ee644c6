import { existsSync, readFileSync, statSync } from "node:fs";
import { Trouble } from "./trouble.mjs";

/**
 * Who runs PostgreSQL: ourselves, or as root (which PostgreSQL refuses) the owner of the data folder, else Debian's `postgres`.
 *
 * Returns  `{ uid, gid }` to start processes with; both undefined when we run it ourselves
 */
export function postgresAccount(dataFolder) {
  if (process.getuid?.() !== 0) return { uid: undefined, gid: undefined };
  if (existsSync(dataFolder)) {
    const { uid, gid } = statSync(dataFolder);
    if (uid !== 0) return { uid, gid };
  }
  const account = readFileSync("/etc/passwd", "utf8")
    .split("\n")
    .map((line) => line.split(":"))
    .find(([name]) => name === "postgres");
  if (!account)
    throw new Trouble("PostgreSQL refuses to run as root and there is no account postgres. Make one: useradd --system postgres");
  return { uid: Number(account[2]), gid: Number(account[3]) };
}

/** True when the account may pass through the folder and every parent of it. */
export async function canReach(processes, folder, { uid, gid }) {
  const { code } = await processes.runToEnd("reach", "test", ["-x", folder], {
    uid,
    gid,
    cwd: "/",
    env: { PATH: process.env.PATH },
  });
  return code === 0;
}

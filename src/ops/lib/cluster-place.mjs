import { createHash } from "node:crypto";
import { chmodSync, chownSync, existsSync, lstatSync, mkdirSync, rmSync } from "node:fs";
import { dirname, join } from "node:path";
import { canReach, postgresAccount } from "./postgres-account.mjs";
import { Trouble } from "./trouble.mjs";

/**
 * Where the data folder goes. It belongs into the home of the installation; but as root PostgreSQL runs under another account,
 * which cannot pass through a parent like /root, or own a file on some mounted disks. Then it goes below /var/tmp, always to the same place.
 *
 * wanted   the data folder in the home
 * Returns  `{ dataFolder, account }`
 */
export async function placeCluster(processes, wanted, elsewhere = "/var/tmp") {
  const account = postgresAccount(wanted);
  if (account.uid === undefined || ((await canReach(processes, dirname(wanted), account)) && canOwn(wanted, account)))
    return { dataFolder: wanted, account };

  const fallback = fallbackFolder(wanted, elsewhere);
  const dataFolder = join(fallback, "cluster");
  mkdirSync(fallback, { recursive: true, mode: 0o711 });
  const { uid, mode } = lstatSync(fallback);
  if (!lstatSync(fallback).isDirectory() || uid !== 0 || (mode & 0o022) !== 0) {
    throw new Trouble(`${fallback} belongs to someone else. Remove it, then run the command again.`);
  }
  chmodSync(fallback, 0o711);
  return { dataFolder, account: postgresAccount(dataFolder) };
}

export function fallbackFolder(wanted, elsewhere = "/var/tmp") {
  return join(elsewhere, `ebbmark-${createHash("sha256").update(wanted).digest("hex").slice(0, 12)}`);
}

function canOwn(folder, { uid, gid }) {
  if (existsSync(folder)) return true;
  const trial = `${folder}.new`;
  try {
    mkdirSync(trial, { recursive: true, mode: 0o700 });
    chownSync(trial, uid, gid);
    if (lstatSync(trial).uid === uid) return true;
    rmSync(trial, { recursive: true, force: true });
    return false;
  } catch (error) {
    rmSync(trial, { recursive: true, force: true });
    if (["EPERM", "EINVAL", "EOPNOTSUPP"].includes(error.code)) return false;
    throw error;
  }
}

import { randomBytes } from "node:crypto";
import { chmodSync, existsSync, readFileSync, renameSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { shellWord } from "./shell-word.mjs";
import { Trouble } from "./trouble.mjs";

const names = [
  "superuserPassword",
  "ownerPassword",
  "readPassword",
  "writePassword",
  "signPassword",
  "sessionSecret",
  "passwordPepper",
  "s3AccessKeyId",
  "s3SecretAccessKey",
];

/**
 * The secrets of this installation, made once and kept in a file that only its owner can read.
 *
 * haveData    true when a database exists already: then missing secrets cannot be made anew, since its passwords hang on them
 * dataFolder  where that database is
 */
export function readSecrets(home, { haveData, dataFolder = join(home, "cluster") }) {
  const file = join(home, "secrets.json");
  const kept = existsSync(file) ? parse(file) : undefined;
  if (!kept && haveData) {
    throw new Trouble(
      `${file} is missing, but the database that needs it exists. Restore the file, or move the database away to begin empty: mv ${shellWord(dataFolder)} ${shellWord(`${dataFolder}.old`)}`,
    );
  }
  const secrets = Object.fromEntries(names.map((name) => [name, kept?.[name] ?? randomBytes(32).toString("base64url")]));
  if (!kept || names.some((name) => !kept[name])) {
    writeFileSync(`${file}.new`, `${JSON.stringify(secrets, null, 2)}\n`, { mode: 0o600 });
    renameSync(`${file}.new`, file);
  }
  chmodSync(file, 0o600);
  return secrets;
}

function parse(file) {
  try {
    const value = JSON.parse(readFileSync(file, "utf8"));
    if (value && typeof value === "object") return value;
  } catch (error) {
    if (error.code) throw error;
  }
  throw new Trouble(`${file} is damaged: it is not the JSON that was written. Restore it from a backup.`);
}

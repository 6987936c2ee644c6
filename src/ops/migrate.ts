/**
 * Entry point: brings the database to this version. Reads its addresses and passwords from the environment, prints one line.
 *
 *   EBBMARK_SUPERUSER_URL, EBBMARK_DB, EB_OWNER_PASSWORD, EB_READ_PASSWORD, EB_WRITE_PASSWORD, EB_SIGN_PASSWORD
 *   EBBMARK_INSTALLATION  optional; the installation's name in its record, used on the first run only
 */
import { pathToFileURL } from "node:url";
import { migrate } from "../../db/migrate/migrate";

export { migrate } from "../../db/migrate/migrate";
export type { MigrateOptions, MigrateResult } from "../../db/migrate/migrate";

async function main(env: NodeJS.ProcessEnv): Promise<void> {
  const names = [
    "EBBMARK_SUPERUSER_URL",
    "EBBMARK_DB",
    "EB_OWNER_PASSWORD",
    "EB_READ_PASSWORD",
    "EB_WRITE_PASSWORD",
    "EB_SIGN_PASSWORD",
  ];
  const missing = names.filter((name) => !env[name]);
  if (missing.length > 0) throw new Error(`Set ${missing.join(", ")} first.`);

  const value = (name: string) => env[name] ?? "";
  const result = await migrate({
    superuserUrl: value("EBBMARK_SUPERUSER_URL"),
    database: value("EBBMARK_DB"),
    passwords: {
      eb_owner: value("EB_OWNER_PASSWORD"),
      eb_read: value("EB_READ_PASSWORD"),
      eb_write: value("EB_WRITE_PASSWORD"),
      eb_sign: value("EB_SIGN_PASSWORD"),
    },
    installation: env.EBBMARK_INSTALLATION || undefined,
  });
  const applied = [...result.superuser, ...result.app];
  console.log(applied.length > 0 ? `Database migrated: ${applied.join(", ")}.` : "Database is up to date.");
}

if (process.argv[1] && import.meta.url === pathToFileURL(process.argv[1]).href) {
  main(process.env).catch((error: unknown) => {
    console.error(error instanceof Error ? error.message : String(error));
    process.exitCode = 1;
  });
}

import { randomBytes } from "node:crypto";
import { drizzle } from "drizzle-orm/node-postgres";
import { Client, Pool } from "pg";
import type { Database } from "@db/clients";
import { migrate } from "@db/migrate/migrate";

export type TestDatabase = {
  name: string;
  pools: Record<"read" | "write" | "sign" | "owner" | "superuser", Pool>;
  databases: Record<"read" | "write" | "sign", Database>;
  /** Migrates this database again. */
  migrateAgain: (options?: { superuserFolder?: string }) => ReturnType<typeof migrate>;
  drop: () => Promise<void>;
};

/**
 * A migrated database of its own on the test cluster, so that a test may tamper with its record without spoiling another's.
 * The addresses of the cluster come from the environment that the test command sets.
 */
export async function freshDatabase(label: string): Promise<TestDatabase> {
  const name = `ebbmark_${label}_${randomBytes(4).toString("hex")}`;
  const options = {
    superuserUrl: setting("EBBMARK_SUPERUSER_URL"),
    database: name,
    passwords: passwords(),
    installation: `test.${label}`,
  };
  await migrate(options);

  const pool = (url: string, max: number) => new Pool({ connectionString: withDatabase(url, name), max });
  const pools = {
    read: pool(setting("DATABASE_URL_READ"), 10),
    write: pool(setting("DATABASE_URL_WRITE"), 10),
    sign: pool(setting("DATABASE_URL_SIGN"), 30),
    owner: pool(setting("DATABASE_URL_OWNER"), 3),
    superuser: pool(setting("EBBMARK_SUPERUSER_URL"), 5),
  };
  for (const each of Object.values(pools)) each.on("error", () => undefined);
  return {
    name,
    pools,
    databases: { read: drizzle(pools.read), write: drizzle(pools.write), sign: drizzle(pools.sign) },
    migrateAgain: (more) => migrate({ ...options, ...more }),
    drop: async () => {
      await Promise.all(Object.values(pools).map((each) => each.end()));
      const superuser = new Client({ connectionString: setting("EBBMARK_SUPERUSER_URL") });
      await superuser.connect();
      await superuser.query(`drop database ${name} with (force)`);
      await superuser.end();
    },
  };
}

const passwords = () => ({
  eb_owner: setting("EB_OWNER_PASSWORD"),
  eb_read: setting("EB_READ_PASSWORD"),
  eb_write: setting("EB_WRITE_PASSWORD"),
  eb_sign: setting("EB_SIGN_PASSWORD"),
});

/** Same server and login, other database; also for addresses that name a socket folder. */
function withDatabase(url: string, name: string): string {
  return url.replace(/^(postgres(?:ql)?:\/\/[^/]*\/)[^?]*/, `$1${name}`);
}

function setting(name: string): string {
  const value = process.env[name];
  if (!value) throw new Error(`${name} is not set. Run these tests with: npm test -- integration`);
  return value;
}

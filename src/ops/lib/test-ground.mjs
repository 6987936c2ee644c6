import { buildEngineFiles } from "./build-engine-files.mjs";
import { databaseUrl, migrateEnvironment, webEnvironment } from "./environment.mjs";
import { openDatabase } from "./open-database.mjs";
import { runScript } from "./scripts.mjs";
import { startFakes } from "./services.mjs";

/** What the tests hash passwords with: the lowest cost that the algorithm knows. */
const bcryptCost = 4;

/** What the parts of a test run stand on; each piece is made when a part first asks for it, and then shared. */
export function createTestGround({ processes, places, say, step }) {
  const workers = once(() => step("engine", () => buildEngineFiles(processes, places, say)));
  const server = once(() => step("database", () => openDatabase(processes, places, { say, throwAway: true })));
  const fakes = once(async () => startFakes(processes, { places, secrets: (await server()).secrets }));

  /**
   * A migrated, empty database.
   *
   * Returns  `{ web, database }`: what the product runs on, and what migrations and tests of the database need besides
   */
  async function environments({ name, port, nodeEnv }) {
    const { secrets, port: databasePort } = await server();
    const services = await fakes();
    const migration = migrateEnvironment({ secrets, port: databasePort, database: name });
    await step("migrations", () => runScript(processes, "migrations", "src/ops/migrate.ts", migration).then(() => name));
    const owner = databaseUrl({ user: "eb_owner", password: secrets.ownerPassword, port: databasePort, database: name });
    return {
      web: webEnvironment({
        secrets,
        databasePort,
        database: name,
        port,
        services,
        places,
        workers: await workers(),
        bcryptCost,
        nodeEnv,
      }),
      database: { ...migration, DATABASE_URL_OWNER: owner },
    };
  }

  return { workers, environments };
}

function once(make) {
  let made;
  return () => (made ??= make());
}

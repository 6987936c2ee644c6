/**
 * Entry point: loads the demo and prints its accounts as one JSON line. Reads the environment of the web server.
 *
 * Run as   node --conditions=react-server --import tsx src/ops/seed.ts
 */
import { closeDatabases } from "@db/clients";
import { loadDemo } from "@db/seed/demo";
import { listDemoAccounts } from "@/server/demo/read";

async function main(): Promise<void> {
  const accounts = (await loadDemo()) ? await listDemoAccounts() : [];
  console.log(JSON.stringify({ accounts }));
}

main()
  .catch((error: unknown) => {
    console.error(error instanceof Error ? (error.stack ?? error.message) : String(error));
    process.exitCode = 1;
  })
  .finally(closeDatabases);

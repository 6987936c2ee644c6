import { join } from "node:path";
import { startMailFake } from "./fakes/mail-fake";
import { startStorageFake } from "./fakes/storage-fake";

/**
 * The local stand-ins for mail and object storage as one process. Once both listen it sends `{ smtpUrl, s3Endpoint }` to the process
 * that started it, or prints the same when started by hand; it ends on SIGTERM, or when that process is gone.
 */
async function main(): Promise<void> {
  const home = required("EBBMARK_HOME");
  const mail = await startMailFake(join(home, "mail"));
  const storage = await startStorageFake(join(home, "storage"), required("S3_ACCESS_KEY_ID"));
  const ready = { smtpUrl: mail.url, s3Endpoint: storage.endpoint };
  if (process.send) process.send(ready);
  else process.stdout.write(`${JSON.stringify(ready)}\n`);

  const close = () => void Promise.all([mail.close(), storage.close()]).then(() => process.exit(0));
  process.once("SIGTERM", close);
  process.once("SIGINT", close);
  if (process.send) process.once("disconnect", close);
}

function required(name: string): string {
  const value = process.env[name];
  if (!value) throw new Error(`${name} is not set`);
  return value;
}

main().catch((error: unknown) => {
  process.stderr.write(`fakes: ${error instanceof Error ? error.message : String(error)}\n`);
  process.exit(1);
});

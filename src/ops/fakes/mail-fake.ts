import { mkdirSync, renameSync, writeFileSync } from "node:fs";
import type { AddressInfo } from "node:net";
import { join } from "node:path";
import { simpleParser, type AddressObject } from "mailparser";
import { SMTPServer, type SMTPServerDataStream } from "smtp-server";

const largestMailBytes = 10_000_000;

/** What is written beside each mail for people and tests that do not read MIME. */
export type StoredMail = {
  receivedAt: string;
  messageId: string | null;
  from: string;
  to: string[];
  subject: string;
  text: string;
  html: string | null;
};

/**
 * An SMTP server that delivers nowhere: each mail becomes `<time>-<n>.eml` as received and a `.json` to read it by.
 *
 * folder   where mails are written
 * Returns  the address to send to, and `close`
 */
export async function startMailFake(folder: string): Promise<{ url: string; close: () => Promise<void> }> {
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  let count = 0;
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ["STARTTLS", "AUTH"],
    disableReverseLookup: true,
    size: largestMailBytes,
    onData(stream, session, done) {
      const to = session.envelope.rcptTo.map(({ address }) => address);
      count += 1;
      receive(stream, { folder, to, count }).then(() => done(), done);
    },
  });
  await new Promise<void>((ready, fail) => {
    server.once("error", fail);
    server.listen(0, "127.0.0.1", ready);
  });
  const { port } = server.server.address() as AddressInfo;
  return { url: `smtp://127.0.0.1:${port}`, close: () => new Promise((done) => server.close(() => done())) };
}

async function receive(
  stream: SMTPServerDataStream,
  { folder, to, count }: { folder: string; to: string[]; count: number },
): Promise<void> {
  const chunks: Buffer[] = [];
  for await (const chunk of stream) chunks.push(chunk as Buffer);
  if (stream.sizeExceeded) throw Object.assign(new Error("The mail is too large"), { responseCode: 552 });
  const bytes = Buffer.concat(chunks);
  const receivedAt = new Date().toISOString();
  const mail = await simpleParser(bytes);
  const stored: StoredMail = {
    receivedAt,
    messageId: mail.messageId ?? null,
    from: (mail.from as AddressObject | undefined)?.text ?? "",
    to,
    subject: mail.subject ?? "",
    text: mail.text ?? "",
    html: mail.html || null,
  };
  const name = `${receivedAt.replace(/[:.]/g, "-")}-${String(count).padStart(4, "0")}`;
  writeWhole(join(folder, `${name}.eml`), bytes);
  writeWhole(join(folder, `${name}.json`), `${JSON.stringify(stored, null, 2)}\n`);
}

/** A reader that watches the folder never sees half a file. */
function writeWhole(file: string, content: string | Buffer): void {
  writeFileSync(`${file}.part`, content, { mode: 0o600 });
  renameSync(`${file}.part`, file);
}

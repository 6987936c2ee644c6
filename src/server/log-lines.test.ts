import { Writable } from "node:stream";
import pino from "pino";
import { describe, expect, it } from "vitest";
import { redacted } from "./log-lines";

describe("a line of the log", () => {
  it("never holds what opens a door, wherever in the object it stands", () => {
    const lines: string[] = [];
    const sink = new Writable({ write: (chunk, _encoding, done) => (lines.push(String(chunk)), done()) });
    const secret = "amber-kettle-on-the-quay";
    const log = pino({ redact: { paths: redacted, censor: "[cut]" } }, sink);
    log.info({
      password: secret,
      current: secret,
      next: secret,
      firstPassword: secret,
      cookie: secret,
      authorization: secret,
      nonce: secret,
    });
    log.info({
      body: { password: secret, firstPassword: secret, nonce: secret },
      headers: { cookie: secret, authorization: secret, "set-cookie": secret },
    });
    expect(lines).toHaveLength(2);
    expect(lines.join("")).not.toContain(secret);
    expect(lines.join("")).toContain("[cut]");
  });
});

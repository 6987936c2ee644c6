import { createServer, type Server } from "node:net";
import { afterEach, describe, expect, it } from "vitest";
import { checkPortFree, freePort, parsePort } from "./free-port.mjs";

let taken: Server | undefined;
afterEach(() => new Promise<void>((done) => (taken ? taken.close(() => done()) : done())));

async function take(host: string): Promise<number> {
  const port = await freePort();
  taken = createServer();
  await new Promise<void>((done, fail) => taken?.once("error", fail).listen({ host, port }, done));
  return port;
}

describe("checkPortFree", () => {
  it("lets a free port pass", async () => {
    await expect(checkPortFree(await freePort())).resolves.toBeUndefined();
  });

  it.each(["127.0.0.1", "0.0.0.0"])(
    "refuses a port that another program holds at %s, and says how to choose another",
    async (host) => {
      const port = await take(host);
      await expect(checkPortFree(port)).rejects.toThrow(
        `Port ${port} is taken by another program. Stop it, or choose another port: PORT=${port + 1} npm run up`,
      );
    },
  );
});

describe("parsePort", () => {
  it("takes 3000 when nothing is said", () => {
    expect([parsePort(undefined), parsePort(""), parsePort("8080")]).toEqual([3000, 3000, 8080]);
  });

  it.each(["0", "65536", "3000x", "-1", "3e3", " 1", "0x10"])("refuses %j", (text) => {
    expect(() => parsePort(text)).toThrow(/PORT must be a whole number from 1 to 65535/);
  });
});

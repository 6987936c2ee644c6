import { createServer } from "node:net";
import { Trouble } from "./trouble.mjs";

/** A port that nothing listens on at 127.0.0.1 just now. Another program may take it before we do: callers try again. */
export async function freePort() {
  const server = createServer();
  await listen(server, "127.0.0.1", 0);
  const { port } = server.address();
  await close(server);
  return port;
}

/**
 * The port to serve on, from the text of PORT.
 *
 * Throws   Trouble when it is no port number
 */
export function parsePort(text, otherwise = 3000) {
  if (text === undefined || text === "") return otherwise;
  const port = Number(text);
  if (!/^\d+$/.test(text) || port < 1 || port > 65535) {
    throw new Trouble(`PORT must be a whole number from 1 to 65535, not "${text}".`);
  }
  return port;
}

/** Refuses a port that is taken on either address that `localhost` can mean, or that this user may not open. */
export async function checkPortFree(port) {
  for (const host of ["127.0.0.1", "::1"]) {
    const server = createServer();
    try {
      await listen(server, host, port);
    } catch (error) {
      if (error.code === "EADDRINUSE") {
        throw new Trouble(
          `Port ${port} is taken by another program. Stop it, or choose another port: PORT=${port + 1} npm run up`,
        );
      }
      if (error.code === "EACCES") {
        throw new Trouble(`Port ${port} is reserved for the system. Choose one above 1023: PORT=3000 npm run up`);
      }
      // A machine without IPv6 has no ::1 to be taken.
      if (host === "::1" && ["EADDRNOTAVAIL", "EAFNOSUPPORT"].includes(error.code)) continue;
      throw error;
    }
    await close(server);
  }
}

function listen(server, host, port) {
  return new Promise((done, fail) => {
    server.once("error", fail);
    server.listen({ host, port, exclusive: true }, done);
  });
}

function close(server) {
  return new Promise((done) => server.close(done));
}

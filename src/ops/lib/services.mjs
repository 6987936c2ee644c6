import { request } from "node:http";
import { dirname } from "node:path";
import { setTimeout as sleep } from "node:timers/promises";
import { baseEnvironment } from "./environment.mjs";
import { root } from "./places.mjs";
import { scriptArguments } from "./scripts.mjs";
import { Trouble } from "./trouble.mjs";

const fakesPatienceMs = 60_000;
const webPatienceMs = 120_000;

/** Starts the stand-ins for mail and storage. Returns `{ smtpUrl, s3Endpoint, ended }` once both listen. */
export async function startFakes(processes, { places, secrets }) {
  const env = { ...baseEnvironment(), EBBMARK_HOME: places.home, S3_ACCESS_KEY_ID: secrets.s3AccessKeyId };
  const { child, ended, logFile } = processes.start("fakes", process.execPath, scriptArguments("src/ops/fakes.ts"), {
    cwd: root,
    env,
    ipc: true,
  });
  const ready = new Promise((done) => child.once("message", done));
  const addresses = await Promise.race([ready, ended.then(() => undefined), sleep(fakesPatienceMs, undefined, { ref: false })]);
  if (!addresses) throw new Trouble(`The stand-ins for mail and storage did not start. Their log: ${logFile}`);
  return { ...addresses, ended };
}

/** Starts the built server and waits until it says that it is well. Returns `{ ended }`. */
export async function startWeb(processes, { server, port, env }) {
  const { ended, logFile } = processes.start("web", process.execPath, [server], {
    cwd: dirname(server),
    env: { ...baseEnvironment(), ...env },
  });
  await untilHealthy({ port, ended, logFile });
  return { ended, logFile };
}

/** Waits for the health check to answer 200. The address goes by number, so that no name lookup stands between. */
export async function untilHealthy({ port, ended, logFile, patienceMs = webPatienceMs }) {
  let over = false;
  void ended.then(() => (over = true));
  let last = "no answer";
  for (const deadline = performance.now() + patienceMs; performance.now() < deadline && !over; await sleep(150)) {
    last = await healthOf(port);
    if (last === 200) return;
  }
  if (over) throw new Trouble(`The web server ended before it answered. Its log: ${logFile}`);
  throw new Trouble(`The web server is not well after ${patienceMs / 1000} s (/api/v1/health: ${last}). Its log: ${logFile}`);
}

function healthOf(port) {
  return new Promise((done) => {
    const asked = request(
      { host: "127.0.0.1", port, path: "/api/v1/health", headers: { host: `localhost:${port}` }, timeout: 10_000 },
      (answer) => {
        answer.resume();
        done(answer.statusCode);
      },
    );
    asked.once("timeout", () => asked.destroy(new Error("no answer within 10 s")));
    asked.once("error", (error) => done(error.code ?? error.message));
    asked.end();
  });
}

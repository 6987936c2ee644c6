import "server-only";
import pino, { type Logger } from "pino";
import { env } from "./env";

/** Whatever could open a door or name a secret is cut before a line is written. */
export const redacted = [
  "password",
  "*.password",
  "current",
  "next",
  "firstPassword",
  "*.firstPassword",
  "cookie",
  "*.cookie",
  'headers["set-cookie"]',
  "authorization",
  "*.authorization",
  "nonce",
  "*.nonce",
];

let logger: Logger | undefined;

/** JSON lines on standard output; people by id, never by name. */
export function logLine(): Logger {
  return (logger ??= pino({
    level: env().logLevel,
    base: null,
    timestamp: pino.stdTimeFunctions.isoTime,
    formatters: { level: (label) => ({ level: label }) },
    redact: { paths: redacted, censor: "[cut]" },
  }));
}

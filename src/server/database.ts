import "server-only";
import { databaseFor, type Database } from "@db/clients";
import { env } from "./env";

/** The database under the login that lists and sheets run on: it can change nothing. */
export const readDatabase = (): Database => databaseFor("read", env().databaseUrls);

/** The login of drafts, sessions and everything else that may still change. */
export const writeDatabase = (): Database => databaseFor("write", env().databaseUrls);

import "server-only";
import { databaseFor, type Database } from "@db/clients";
import { env } from "./env";

/** The login that lists and sheets run on: it can change nothing. */
export const readDatabase = (): Database => databaseFor("read", env().databaseUrls);

/** The login of drafts, sessions and everything else that may still change. */
export const writeDatabase = (): Database => databaseFor("write", env().databaseUrls);

/** The login that adds entries to the record, through its functions alone. */
export const signDatabase = (): Database => databaseFor("sign", env().databaseUrls);

export const databases = () => ({ read: readDatabase(), write: writeDatabase(), sign: signDatabase() });

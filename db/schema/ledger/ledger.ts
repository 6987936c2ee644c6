import { customType, pgSchema } from "drizzle-orm/pg-core";

/** The record. Owned by the vault role and made by db/superuser; these tables are described here for typed reads only. */
export const ledger = pgSchema("ledger");

export const bytea = customType<{ data: Buffer }>({ dataType: () => "bytea" });

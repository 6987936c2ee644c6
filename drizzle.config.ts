import { defineConfig } from "drizzle-kit";

// Only schema `app` is generated. Schema `ledger` belongs to the vault role and is made by db/superuser.
export default defineConfig({
  dialect: "postgresql",
  schema: "./db/schema/app/*.ts",
  out: "./drizzle",
  schemaFilter: ["app"],
});

import { pgSchema } from "drizzle-orm/pg-core";

/** Working data of the product: everything that may still change. What was signed lives in schema `ledger`. */
export const app = pgSchema("app");

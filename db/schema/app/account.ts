import { boolean, index, inet, integer, text, timestamp, uuid } from "drizzle-orm/pg-core";
import { app } from "./app";

/** How a person proves who they are. Read and written by the write login alone; list pages run on a login that can't see it. */
export const credential = app.table("credential", {
  personId: uuid("person_id").primaryKey(),
  passwordHash: text("password_hash").notNull(),
  /** True after an administrator set the password: the first sign-in asks for the person's own. */
  mustChange: boolean("must_change").notNull().default(false),
  changedAt: timestamp("changed_at", { withTimezone: true }).notNull().defaultNow(),
});

/** A signed-in browser. The cookie holds the session id; the row, keyed by its SHA-256, is what counts. */
export const session = app.table(
  "session",
  {
    /** Lower-case hex. */
    idSha256: text("id_sha256").primaryKey(),
    personId: uuid("person_id").notNull(),
    createdAt: timestamp("created_at", { withTimezone: true }).notNull().defaultNow(),
    lastSeenAt: timestamp("last_seen_at", { withTimezone: true }).notNull().defaultNow(),
    expiresAt: timestamp("expires_at", { withTimezone: true }).notNull(),
    revokedAt: timestamp("revoked_at", { withTimezone: true }),
    userAgent: text("user_agent").notNull().default(""),
    ipNet: inet("ip_net"),
  },
  (table) => [index("session_by_person").on(table.personId, table.createdAt.desc())],
);

/** Failed attempts by key ("person:…", "net:…"), counted with one atomic upsert. */
export const authThrottle = app.table("auth_throttle", {
  key: text("key").primaryKey(),
  failures: integer("failures").notNull().default(0),
  windowStartedAt: timestamp("window_started_at", { withTimezone: true }).notNull().defaultNow(),
  blockedUntil: timestamp("blocked_until", { withTimezone: true }),
});

/** Shown units and theme, and where mail goes. */
export const personSetting = app.table("person_setting", {
  personId: uuid("person_id").primaryKey(),
  units: text("units", { enum: ["SI", "US"] })
    .notNull()
    .default("SI"),
  theme: text("theme", { enum: ["light", "dark", "system"] })
    .notNull()
    .default("system"),
  email: text("email"),
});

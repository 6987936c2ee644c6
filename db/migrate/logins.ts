import type { Client } from "pg";
import { scramMatches, scramVerifier } from "./scram";

export const logins = ["eb_owner", "eb_read", "eb_write", "eb_sign"] as const;
export type Login = (typeof logins)[number];

const connectionLimit: Record<Login, number> = { eb_owner: 5, eb_read: 60, eb_write: 60, eb_sign: 40 };

/**
 * Makes the vault role and the four logins, and brings their passwords to those given. Nobody is ever a member of the vault role.
 * Needs a superuser connection; changes nothing that is right already.
 */
export async function ensureLogins(superuser: Client, passwords: Record<Login, string>): Promise<void> {
  const { rows } = await superuser.query<{ rolname: string; rolpassword: string | null }>(
    "select rolname, rolpassword from pg_catalog.pg_authid where rolname like 'eb\\_%'",
  );
  const known = new Map(rows.map(({ rolname, rolpassword }) => [rolname, rolpassword]));

  if (!known.has("eb_vault")) {
    await superuser.query("create role eb_vault nologin nosuperuser nocreatedb nocreaterole noinherit noreplication nobypassrls");
  }
  for (const login of logins) {
    if (!known.has(login)) {
      await superuser.query(
        `create role ${login} login nosuperuser nocreatedb nocreaterole noinherit noreplication nobypassrls connection limit ${connectionLimit[login]}`,
      );
    }
    if (!scramMatches(known.get(login) ?? null, passwords[login])) {
      await superuser.query(`alter role ${login} password ${superuser.escapeLiteral(scramVerifier(passwords[login]))}`);
    }
  }
}

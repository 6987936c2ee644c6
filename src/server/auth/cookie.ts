import "server-only";
import { sealData, unsealData } from "iron-session";
import { env } from "@/server/env";

/** Seconds a session lives whatever happens, and without a request. */
export const absoluteLifeS = 12 * 3600;
export const idleLifeS = 30 * 60;

/** `__Host-` binds the cookie to this very host, but a browser takes it only over TLS; on http://localhost the plain name stands in. */
export const cookieName = (): string => (env().secure ? "__Host-eb" : "eb");

/** Seals the random session id. The seal holds nothing else: the row in the database is what counts. */
export const sealSessionId = (id: string): Promise<string> =>
  sealData({ id }, { password: env().sessionSecret, ttl: absoluteLifeS });

/** The session id in a sealed cookie, or undefined when it is missing, forged or too old. */
export async function unsealSessionId(sealed: string | undefined): Promise<string | undefined> {
  if (!sealed || sealed.length > 1024) return undefined;
  const { id } = await unsealData<{ id?: unknown }>(sealed, { password: env().sessionSecret, ttl: absoluteLifeS });
  return typeof id === "string" ? id : undefined;
}

const attributes = () => `Path=/; HttpOnly; SameSite=Lax${env().secure ? "; Secure" : ""}`;

export const sessionCookie = (sealed: string): string => `${cookieName()}=${sealed}; Max-Age=${absoluteLifeS}; ${attributes()}`;
export const clearedCookie = (): string => `${cookieName()}=; Max-Age=0; ${attributes()}`;

/** The value of one cookie of a plain request. */
export function cookieOf(request: Request, name = cookieName()): string | undefined {
  for (const pair of (request.headers.get("cookie") ?? "").split(";")) {
    const at = pair.indexOf("=");
    if (at > 0 && pair.slice(0, at).trim() === name) return pair.slice(at + 1).trim();
  }
  return undefined;
}

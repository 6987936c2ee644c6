import { randomBytes } from "node:crypto";
import { closeDatabases } from "@db/clients";
import { defaultPolicy } from "@/contracts/policy";
import type { Role } from "@/contracts/roles";
import type { FacilityView, PersonDetailView, SectionView } from "@/contracts/views";
import type { Handler } from "@/server/door";
import { migrate } from "../../../db/migrate/migrate";

const value = (name: string): string => {
  const found = process.env[name];
  if (!found) throw new Error(`${name} is not set; run the integration tests through the test command.`);
  return found;
};

/** A database of this file's own on the throw-away cluster, and the environment the server reads pointed at it. */
export async function openGround(): Promise<void> {
  const database = `ebbmark_${randomBytes(6).toString("hex")}`;
  await migrate({
    superuserUrl: value("EBBMARK_SUPERUSER_URL"),
    database,
    passwords: {
      eb_owner: value("EB_OWNER_PASSWORD"),
      eb_read: value("EB_READ_PASSWORD"),
      eb_write: value("EB_WRITE_PASSWORD"),
      eb_sign: value("EB_SIGN_PASSWORD"),
    },
  });
  for (const name of ["DATABASE_URL_READ", "DATABASE_URL_WRITE", "DATABASE_URL_SIGN"]) {
    const url = new URL(value(name));
    url.pathname = `/${database}`;
    process.env[name] = url.href;
  }
  process.env.LOG_LEVEL = "silent";
}

export const closeGround = (): Promise<void> => closeDatabases();

export type Called = { status: number; body: unknown; headers: Headers; cookie: string | undefined };

type Call = {
  method?: string;
  body?: unknown;
  cookie?: string | undefined;
  params?: Record<string, string>;
  query?: string;
  headers?: Record<string, string>;
};

/** Calls a route handler as a browser on our own page would. Headers given here replace those. */
export async function call(
  handler: Handler,
  { method, body, cookie, params = {}, query = "", headers = {} }: Call = {},
): Promise<Called> {
  const sent = new Headers({ origin: value("EBBMARK_ORIGIN"), "sec-fetch-site": "same-origin", "user-agent": "test browser" });
  if (body !== undefined) sent.set("content-type", "application/json");
  if (cookie) sent.set("cookie", cookie);
  for (const [name, text] of Object.entries(headers)) {
    if (text === "") sent.delete(name);
    else sent.set(name, text);
  }
  const request = new Request(`${value("EBBMARK_ORIGIN")}/api/v1/called${query}`, {
    method: method ?? (body === undefined ? "GET" : "POST"),
    headers: sent,
    ...(body === undefined ? {} : { body: typeof body === "string" ? body : JSON.stringify(body) }),
  });
  const response = await handler(request, { params: Promise.resolve(params) });
  const text = await response.text();
  const set = response.headers.getSetCookie().find((one) => one.startsWith("eb="));
  return {
    status: response.status,
    body: text === "" ? undefined : (JSON.parse(text) as unknown),
    headers: response.headers,
    cookie: set?.split(";")[0],
  };
}

/** The answer's body, after making sure that the request was not refused. */
export function got<T>({ status, body }: Called): T {
  if (status >= 400) throw new Error(`refused with ${status}: ${JSON.stringify(body)}`);
  return body as T;
}

export const codeOf = ({ body }: Called): string => (body as { type: string }).type.replace("urn:ebbmark:", "");

export const passwordOf = (badge: string): string => `${badge} keeps a long sentence`;

/** Enrols the first administrator, as an installation does, and signs her in. */
export async function firstAdministrator(): Promise<string> {
  const { enrolPerson } = await import("@/server/people/write");
  const { systemViewer } = await import("@/server/auth/viewer");
  await enrolPerson(
    systemViewer("seed"),
    { badge: "D-001", printedName: "Ada Dorn", role: "administrator", firstPassword: passwordOf("D-001") },
    { mustChange: false },
  );
  return signIn("D-001");
}

export async function signIn(badge: string, password = passwordOf(badge)): Promise<string> {
  const { POST } = await import("@/app/api/v1/session/route");
  const answer = await call(POST, { body: { badge, password } });
  if (!answer.cookie) throw new Error(`${badge} could not sign in: ${JSON.stringify(answer.body)}`);
  return answer.cookie;
}

/** Invites a person, who then chooses the password of `passwordOf`. Returns a cookie of theirs and their id. */
export async function join(
  administrator: string,
  { badge, role, facilityIds }: { badge: string; role: Role; facilityIds: string[] },
): Promise<{ cookie: string; id: string }> {
  const people = await import("@/app/api/v1/people/route");
  const password = await import("@/app/api/v1/password/route");
  const first = `first words for ${badge}`;
  const invited = await call(people.POST, {
    cookie: administrator,
    body: { badge, printedName: `Person ${badge}`, role, firstPassword: first, facilityIds },
  });
  const { id } = got<PersonDetailView>(invited);
  const cookie = await signIn(badge, first);
  got(await call(password.POST, { cookie, body: { current: first, next: passwordOf(badge) } }));
  return { cookie, id };
}

export async function makeFacility(administrator: string, code: string): Promise<FacilityView> {
  const { POST } = await import("@/app/api/v1/facilities/route");
  const body = { code, name: `Facility ${code}`, barometricPressurePa: 101325, policy: defaultPolicy };
  return got(await call(POST, { cookie: administrator, body }));
}

export async function makeSection(engineer: string, facilityId: string, tag = "IS-52"): Promise<SectionView> {
  const { POST } = await import("@/app/api/v1/sections/route");
  return got(await call(POST, { cookie: engineer, body: { facilityId, tag, name: "Nitrogen bottle bank", description: "" } }));
}

export async function makeScreening(engineer: string, sectionId: string): Promise<{ id: string; record: string; rev: number }> {
  const { POST } = await import("@/app/api/v1/screenings/route");
  return got(await call(POST, { cookie: engineer, body: { sectionId, title: "Bottle bank, cold" } }));
}

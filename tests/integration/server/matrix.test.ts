import { join, resolve } from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { roles, type Role } from "@/contracts/roles";
import { apiAddresses } from "@/server/auth/addresses";
import { openActs, ruleFor, type Act } from "@/server/auth/matrix";
import type { Handler } from "@/server/door";
import { nitrogenBottleBank } from "@db/seed/nitrogen-bottle-bank";
import { defaultPolicy } from "@/contracts/policy";
import {
  call,
  type Called,
  closeGround,
  codeOf,
  firstAdministrator,
  got,
  join as joinAs,
  makeFacility,
  makeScreening,
  makeSection,
  openGround,
  signIn,
} from "./ground";

/**
 * Every address with every role, inside the facility and outside of it, against a screening that exists. The matrix says what to expect;
 * the answer is the product's.
 */
const app = resolve(import.meta.dirname, "../../../src/app");
const routes = new Map<string, Record<string, Handler>>();
const handlerOf = (address: string, method: string): Handler => {
  const found = routes.get(address)?.[method];
  if (!found) throw new Error(`no handler for ${method} ${address}`);
  return found;
};

const inside: Partial<Record<Role, string>> = {};
const outside: Partial<Record<Role, string>> = {};
const ids: Record<string, string> = {};
let disabled: string;

beforeAll(async () => {
  for (const address of Object.keys(apiAddresses)) {
    routes.set(address, (await import(join(app, address, "route.ts"))) as Record<string, Handler>);
  }
  await openGround();
  const administrator = await firstAdministrator();
  const here = await makeFacility(administrator, "HERE");
  const there = await makeFacility(administrator, "THERE");
  let n = 100;
  for (const role of ["engineer", "approver", "auditor"] as const) {
    inside[role] = (await joinAs(administrator, { badge: `P-${n++}`, role, facilityIds: [here.id] })).cookie;
    outside[role] = (await joinAs(administrator, { badge: `P-${n++}`, role, facilityIds: [there.id] })).cookie;
  }
  const other = await joinAs(administrator, { badge: "P-200", role: "engineer", facilityIds: [] });
  inside.administrator = administrator;
  outside.administrator = administrator;
  const section = await makeSection(inside.engineer ?? "", here.id);
  const screening = await makeScreening(inside.engineer ?? "", section.id);
  Object.assign(ids, {
    facilityId: here.id,
    sectionId: section.id,
    screeningId: screening.id,
    personId: other.id,
    sessionId: "0".repeat(64),
    seq: "1",
  });

  const gone = await joinAs(administrator, { badge: "P-201", role: "engineer", facilityIds: [here.id] });
  disabled = gone.cookie;
  const change = handlerOf("/api/v1/people/[personId]", "POST");
  got(
    await call(change, {
      cookie: administrator,
      params: { personId: gone.id },
      body: { act: "disable", reason: "Test of a disabled person." },
    }),
  );
});
afterAll(closeGround);

/** A body that passes the schema, so that the refusal (or not) is about the person. */
function bodyOf(address: string, method: string): unknown {
  const signature = {
    rev: 1,
    nonce: "x".repeat(24),
    idempotencyKey: "y".repeat(24),
    shownSha256: "0".repeat(64),
    password: "no matter",
  };
  const name = `${method} ${address.replace("/api/v1", "")}`;
  const bodies: Record<string, unknown> = {
    "POST /password": { current: "no matter", next: "a new long password" },
    "PUT /preferences": { units: "US" },
    "POST /people": { badge: "not a badge" },
    "POST /people/[personId]": { act: "confirm-role", role: "auditor" },
    "POST /facilities": {
      code: `F${Math.floor(Math.random() * 1e6)}`,
      name: "New",
      barometricPressurePa: 101325,
      policy: defaultPolicy,
    },
    "POST /facilities/[facilityId]/members": { act: "remove", personId: ids.personId },
    "POST /sections": { facilityId: ids.facilityId, tag: `T${Math.floor(Math.random() * 1e9)}`, name: "New", description: "" },
    "POST /screenings": { sectionId: ids.sectionId, title: "New" },
    "PUT /screenings/[screeningId]/draft": { baseVersion: 99, document: nitrogenBottleBank() },
    "POST /screenings/[screeningId]/compute": { draftVersion: 1 },
    "POST /screenings/[screeningId]/ceremony": { act: "sign", rev: 1 },
    "POST /screenings/[screeningId]/sign": { ...signature, acknowledged: [] },
    "POST /screenings/[screeningId]/countersign": { ...signature, acknowledged: [], conditions: [] },
    "POST /screenings/[screeningId]/return": { ...signature, remarks: [{ line: "2.09", text: "x" }] },
    "POST /screenings/[screeningId]/withdraw": { ...signature, reason: "x" },
    "POST /screenings/[screeningId]/revisions": { fromRev: 1, reason: "x" },
    "POST /calculations": { format: "nothing" },
  };
  return bodies[name];
}

const ask = (address: string, method: string, cookie: string | undefined): Promise<Called> => {
  const names = [...address.matchAll(/\[(\w+)\]/g)].map((match) => match[1] ?? "");
  return call(handlerOf(address, method), {
    method,
    cookie,
    body: bodyOf(address, method),
    params: Object.fromEntries(names.map((name) => [name, ids[name] ?? ""])),
  });
};

const cells = Object.entries(apiAddresses).flatMap(([address, methods]) =>
  Object.entries(methods).map(([method, acts]) => ({ address, method, acts: acts as readonly Act[] })),
);
const closed = cells.filter(
  ({ acts }) => !acts.some((act) => (openActs as readonly string[]).includes(act)) && acts[0] !== "session.close",
);

describe.each(closed)("$method $address", ({ address, method, acts }) => {
  it("is shut to strangers, to forged cookies and to disabled people", async () => {
    for (const cookie of [undefined, "eb=forged", disabled])
      expect(codeOf(await ask(address, method, cookie))).toBe("not-signed-in");
  });

  it.each(roles)("answers the %s of the facility as the matrix says", async (role) => {
    const answer = await ask(address, method, inside[role]);
    const rules = acts.map((act) => ruleFor(act, role));
    expect(answer.status, JSON.stringify(answer.body)).not.toBe(500);
    if (rules.every((rule) => rule === "-")) return expect(codeOf(answer)).toBe("not-allowed");
    if (answer.status < 400) return;
    const shut = [
      "not-signed-in",
      "must-change-password",
      ...(rules.some((rule) => personal.includes(rule)) ? [] : ["not-allowed"]),
    ];
    expect(shut).not.toContain(codeOf(answer));
  });

  it.each(roles)("shows an %s of another facility nothing", async (role) => {
    const answer = await ask(address, method, outside[role]);
    const rules = acts.map((act) => ruleFor(act, role));
    if (rules.every((rule) => rule === "-")) return expect(codeOf(answer)).toBe("not-allowed");
    if (!rules.every((rule) => ["M", "C", "N", "O", "-"].includes(rule)) || !aboutAPlace(address)) return;
    if (method === "GET" && !address.includes("["))
      return expect(JSON.stringify(answer.body)).not.toContain(ids.screeningId ?? "");
    expect([answer.status, codeOf(answer)]).toEqual([404, "not-found"]);
  });
});

/** Rules that may refuse a member too, for whose work it is. */
const personal: readonly string[] = ["C", "N", "O", "X"];
const aboutAPlace = (address: string): boolean => /^\/api\/v1\/(facilities\/|sections|screenings)/.test(address);

describe("what is not signed", () => {
  it("is not there for the auditor", async () => {
    expect((await ask("/api/v1/screenings/[screeningId]", "GET", inside.auditor)).status).toBe(404);
    const list = await ask("/api/v1/screenings", "GET", inside.auditor);
    expect(list.body).toMatchObject({
      rows: [],
      total: 0,
      next: null,
      cautions: [expect.stringContaining("This is a screening.")],
    });
  });

  it("shows on no desk but those of the facility", async () => {
    const { getDesk } = await import("@/server/desk/read");
    const { viewerFromCookie } = await import("@/server/auth/viewer");
    const deskOf = async (cookie: string | undefined) => {
      const viewer = await viewerFromCookie(cookie?.slice(3));
      if (!viewer) throw new Error("no session");
      return getDesk(viewer);
    };
    expect((await deskOf(inside.engineer)).yours.map(({ id }) => id)).toContain(ids.screeningId);
    for (const cookie of [outside.engineer, outside.approver, inside.approver, inside.auditor, inside.administrator]) {
      expect(await deskOf(cookie)).toMatchObject({ waits: [], yours: [] });
    }
  });
});

describe("signing out", () => {
  it("is for everybody and ends just this session", async () => {
    for (const role of ["engineer", "approver", "auditor"] as const) {
      const badge = { engineer: "P-100", approver: "P-102", auditor: "P-104" }[role];
      const cookie = await signIn(badge);
      expect((await ask("/api/v1/session", "DELETE", cookie)).status).toBe(204);
      expect((await ask("/api/v1/session", "GET", cookie)).status).toBe(401);
      expect((await ask("/api/v1/session", "GET", inside[role])).status).toBe(200);
    }
  });
});

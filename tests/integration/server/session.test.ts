import { afterAll, beforeAll, describe, expect, it } from "vitest";
import * as password from "@/app/api/v1/password/route";
import * as people from "@/app/api/v1/people/route";
import * as person from "@/app/api/v1/people/[personId]/route";
import * as session from "@/app/api/v1/session/route";
import * as sessions from "@/app/api/v1/sessions/[sessionId]/route";
import type { PersonDetailView, ViewerView } from "@/contracts/views";
import { getAccount } from "@/server/account/read";
import { viewerFromCookie } from "@/server/auth/viewer";
import { writeDatabase } from "@/server/database";
import { call, closeGround, codeOf, firstAdministrator, got, join, openGround, passwordOf, signIn } from "./ground";

let administrator: string;
beforeAll(async () => {
  await openGround();
  administrator = await firstAdministrator();
});
afterAll(closeGround);

const idOf = async (badge: string): Promise<string> => {
  const list = got<PersonDetailView[]>(await call(people.GET, { cookie: administrator }));
  return list.find((one) => one.badge === badge)?.id ?? "";
};

describe("signing in", () => {
  it("opens a session that knows who it is", async () => {
    const answer = await call(session.POST, { body: { badge: "d-001 ", password: passwordOf("D-001") } });
    expect(answer.status).toBe(200);
    expect(answer.headers.getSetCookie()[0]).toMatch(/^eb=.+; Max-Age=43200; Path=\/; HttpOnly; SameSite=Lax$/);
    expect(got<ViewerView>(await call(session.GET, { cookie: answer.cookie }))).toMatchObject({
      badge: "D-001",
      role: "administrator",
    });
  });

  it("gives an unknown badge and a wrong password the same words", async () => {
    const unknown = await call(session.POST, { body: { badge: "E-999", password: "some long password" } });
    const wrong = await call(session.POST, { body: { badge: "D-001", password: "some long password" } });
    expect([unknown.status, codeOf(unknown)]).toEqual([401, "wrong-credentials"]);
    expect({ ...(wrong.body as object), requestId: "" }).toEqual({ ...(unknown.body as object), requestId: "" });
    await signIn("D-001");
  });

  it("refuses a forged, an empty and a foreign cookie", async () => {
    for (const cookie of ["eb=", "eb=Fe26.2*1*aaaa", `eb=${"x".repeat(3000)}`, "other=1", undefined]) {
      expect((await call(session.GET, { cookie })).status).toBe(401);
    }
  });

  it("makes an account wait after five wrong passwords, counts guesses sent at once, and an administrator opens it again", async () => {
    await join(administrator, { badge: "E-201", role: "engineer", facilityIds: [] });
    const guesses = await Promise.all(
      Array.from({ length: 12 }, (_, n) => call(session.POST, { body: { badge: "E-201", password: `a wrong password ${n}` } })),
    );
    const codes = guesses.map(codeOf);
    expect(codes.filter((code) => code === "wrong-credentials")).toHaveLength(5);
    expect(codes.filter((code) => code === "account-locked")).toHaveLength(7);

    const right = await call(session.POST, { body: { badge: "E-201", password: passwordOf("E-201") } });
    expect([right.status, codeOf(right)]).toEqual([429, "account-locked"]);
    expect(Number(right.headers.get("retry-after"))).toBeGreaterThan(20);

    const change = { act: "set-password", firstPassword: "a first password anew" };
    got(await call(person.POST, { cookie: administrator, params: { personId: await idOf("E-201") }, body: change }));
    await signIn("E-201", "a first password anew");
  });

  it("lets an unknown badge wait just the same", async () => {
    const tries = [];
    for (let n = 0; n < 6; n++)
      tries.push(codeOf(await call(session.POST, { body: { badge: "E-998", password: "a wrong password" } })));
    expect(tries).toEqual([...Array<string>(5).fill("wrong-credentials"), "account-locked"]);
  });
});

describe("a first password", () => {
  it("opens nothing but the page that changes it", async () => {
    const first = "first words for A-301";
    got(
      await call(people.POST, {
        cookie: administrator,
        body: { badge: "A-301", printedName: "Ida Roth", role: "approver", firstPassword: first, facilityIds: [] },
      }),
    );
    const cookie = await signIn("A-301", first);
    expect(got<ViewerView>(await call(session.GET, { cookie })).mustChangePassword).toBe(true);
    const list = await import("@/app/api/v1/screenings/route");
    expect(codeOf(await call(list.GET, { cookie }))).toBe("must-change-password");

    const short = await call(password.POST, { cookie, body: { current: first, next: "short" } });
    expect([short.status, (short.body as { problems: object[] }).problems]).toEqual([
      422,
      [expect.objectContaining({ path: "next" })],
    ]);
    expect(codeOf(await call(password.POST, { cookie, body: { current: "not the first one", next: passwordOf("A-301") } }))).toBe(
      "wrong-credentials",
    );
    expect(codeOf(await call(password.POST, { cookie, body: { current: first, next: first } }))).toBe("invalid-request");

    got(await call(password.POST, { cookie, body: { current: first, next: passwordOf("A-301") } }));
    expect((await call(list.GET, { cookie })).status).toBe(200);
    expect(codeOf(await call(session.POST, { body: { badge: "A-301", password: first } }))).toBe("wrong-credentials");
  });

  it("may not be made of the badge or the name", async () => {
    for (const firstPassword of ["E-777-e-777-e-777", "Greta Lindqvist 123", "passwordpassword1", "aaaaaaaaaaaaaaaaaaaa"]) {
      const body = { badge: "E-777", printedName: "Greta Lindqvist", role: "engineer", firstPassword, facilityIds: [] };
      expect(codeOf(await call(people.POST, { cookie: administrator, body }))).toBe("invalid-request");
    }
  });
});

describe("sessions", () => {
  it("end with signing out, on the server as well", async () => {
    const { cookie } = await join(administrator, { badge: "E-401", role: "engineer", facilityIds: [] });
    const out = await call(session.DELETE, { method: "DELETE", cookie });
    expect([out.status, out.headers.getSetCookie()[0]]).toEqual([204, expect.stringMatching(/^eb=; Max-Age=0;/)]);
    expect((await call(session.GET, { cookie })).status).toBe(401);
  });

  it("are five at most; the oldest ends", async () => {
    const { cookie: first } = await join(administrator, { badge: "E-402", role: "engineer", facilityIds: [] });
    const later = [];
    for (let n = 0; n < 5; n++) later.push(await signIn("E-402"));
    expect((await call(session.GET, { cookie: first })).status).toBe(401);
    for (const cookie of later) expect((await call(session.GET, { cookie })).status).toBe(200);
  });

  it("of one's own can be ended one by one, those of others can't", async () => {
    const { cookie } = await join(administrator, { badge: "E-403", role: "engineer", facilityIds: [] });
    const other = await signIn("E-403");
    const viewer = await viewerFromCookie(cookie.slice(3));
    if (!viewer) throw new Error("no session");
    const account = await getAccount(viewer);
    const target = account.sessions.find(({ current }) => !current);
    const stranger = await call(sessions.DELETE, {
      method: "DELETE",
      cookie: administrator,
      params: { sessionId: target?.id ?? "" },
    });
    expect(stranger.status).toBe(404);
    got(await call(sessions.DELETE, { method: "DELETE", cookie, params: { sessionId: target?.id ?? "" } }));
    expect((await call(session.GET, { cookie: other })).status).toBe(401);
    expect((await call(session.GET, { cookie })).status).toBe(200);
  });

  it("end when nobody used them for half an hour, and after twelve hours whatever happens", async () => {
    const { sql } = await import("drizzle-orm");
    const { cookie: idle, id } = await join(administrator, { badge: "E-404", role: "engineer", facilityIds: [] });
    await writeDatabase().execute(
      sql`update app.session set last_seen_at = now() - interval '31 minutes' where person_id = ${id}`,
    );
    expect((await call(session.GET, { cookie: idle })).status).toBe(401);
    const old = await signIn("E-404");
    await writeDatabase().execute(sql`update app.session set expires_at = now() where person_id = ${id}`);
    expect((await call(session.GET, { cookie: old })).status).toBe(401);
  });

  it("end at once when the person is disabled, re-roled or given a new password", async () => {
    for (const [badge, change] of [
      ["E-405", { act: "disable", reason: "Left the site." }],
      ["E-406", { act: "change-role", role: "auditor", reason: "Moved to the audit team." }],
      ["E-407", { act: "set-password", firstPassword: "a first password anew" }],
    ] as const) {
      const { cookie, id } = await join(administrator, { badge, role: "engineer", facilityIds: [] });
      got(await call(person.POST, { cookie: administrator, params: { personId: id }, body: change }));
      expect((await call(session.GET, { cookie })).status).toBe(401);
    }
  });
});

describe("a disabled person", () => {
  it("is told so only with the right password, and is let in again when enabled", async () => {
    const { id } = await join(administrator, { badge: "E-501", role: "engineer", facilityIds: [] });
    const change = (act: "disable" | "re-enable") =>
      call(person.POST, { cookie: administrator, params: { personId: id }, body: { act, reason: "Leave of absence." } });
    expect(got<PersonDetailView>(await change("disable")).active).toBe(false);
    expect(codeOf(await call(session.POST, { body: { badge: "E-501", password: passwordOf("E-501") } }))).toBe(
      "account-disabled",
    );
    expect(codeOf(await call(session.POST, { body: { badge: "E-501", password: "a wrong password" } }))).toBe(
      "wrong-credentials",
    );
    expect(codeOf(await change("disable"))).toBe("wrong-state");
    expect(got<PersonDetailView>(await change("re-enable")).active).toBe(true);
    await signIn("E-501");
  });

  it("is never the administrator herself, and nobody changes their own account", async () => {
    const own = await call(person.POST, {
      cookie: administrator,
      params: { personId: await idOf("D-001") },
      body: { act: "disable", reason: "By mistake." },
    });
    expect([own.status, codeOf(own)]).toEqual([403, "not-allowed"]);
  });
});

describe("a change of role", () => {
  it("takes effect at once with one administrator, and needs the other one from two on", async () => {
    const { id } = await join(administrator, { badge: "E-601", role: "engineer", facilityIds: [] });
    const to = (cookie: string, role: string) =>
      call(person.POST, { cookie, params: { personId: id }, body: { act: "change-role", role, reason: "New duties." } });
    expect(got<PersonDetailView>(await to(administrator, "approver")).role).toBe("approver");

    const { cookie: second } = await join(administrator, { badge: "D-002", role: "administrator", facilityIds: [] });
    const proposed = got<PersonDetailView>(await to(administrator, "auditor"));
    expect(proposed).toMatchObject({ role: "approver", proposedRole: { role: "auditor", mine: true } });
    const confirm = (cookie: string) =>
      call(person.POST, { cookie, params: { personId: id }, body: { act: "confirm-role", role: "auditor" } });
    expect(codeOf(await confirm(administrator))).toBe("own-work");
    expect(got<PersonDetailView>(await confirm(second)).role).toBe("auditor");
    expect(codeOf(await confirm(second))).toBe("wrong-state");
  });
});

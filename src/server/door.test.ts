import { beforeAll, beforeEach, describe, expect, it, vi } from "vitest";
import { z } from "zod";
import type { Role } from "@/contracts/roles";
import type { Problem } from "@/contracts/refusals";
import type { Viewer } from "./auth/viewer";
import { Answer } from "./door-answer";
import { largestBody } from "./door-body";
import { defineOpenRoute, defineRoute, type Handler } from "./door";
import { Refusal } from "./refusal";

const origin = "http://localhost:3000";
let viewer: Partial<Viewer> | null;

vi.mock("./auth/viewer", () => ({ viewerFromCookie: async () => viewer }));

beforeAll(() => {
  Object.assign(process.env, {
    EBBMARK_ORIGIN: origin,
    DATABASE_URL_READ: "postgresql://r@127.0.0.1/x",
    DATABASE_URL_WRITE: "postgresql://w@127.0.0.1/x",
    DATABASE_URL_SIGN: "postgresql://s@127.0.0.1/x",
    SESSION_SECRET: "s".repeat(32),
    PASSWORD_PEPPER: "p".repeat(32),
    EBBMARK_ENGINE_DIR: "/nowhere",
    EBBMARK_ENGINE_THREAD: "/nowhere/thread.mjs",
    EBBMARK_PASSWORD_THREAD: "/nowhere/password.mjs",
    LOG_LEVEL: "silent",
  });
});
beforeEach(() => {
  viewer = { id: "11111111-1111-4111-8111-111111111111", role: "engineer", active: true, mustChangePassword: false };
});

const work = vi.fn();
const post = defineRoute({
  act: "screening.create",
  body: z.strictObject({
    title: z.string().min(1, "a title is needed"),
    rows: z.array(z.strictObject({ n: z.number() })).optional(),
  }),
  status: 201,
  work: async (_viewer, asked) => work(asked),
});
const get = defineRoute({
  act: "desk.read",
  query: z.strictObject({ limit: z.coerce.number().max(9).optional() }),
  work: async (_viewer, asked) => work(asked),
});

type Sent = {
  method?: string;
  headers?: Record<string, string | null>;
  body?: string;
  query?: string;
  params?: Record<string, string>;
};

async function send(
  handler: Handler,
  { method = "POST", headers = {}, body = '{"title":"x"}', query = "", params = {} }: Sent = {},
) {
  const all = { origin, "sec-fetch-site": "same-origin", "content-type": "application/json", ...headers };
  const kept = Object.entries(all).filter((pair): pair is [string, string] => pair[1] !== null);
  const request = new Request(`${origin}/api/v1/thing${query}`, { method, headers: kept, ...(method === "GET" ? {} : { body }) });
  const response = await handler(request, { params: Promise.resolve(params) });
  const text = await response.text();
  return { response, status: response.status, json: text ? (JSON.parse(text) as Problem & Record<string, unknown>) : undefined };
}

describe("a change", () => {
  it("comes in with the right origin and shape, and answers with its status", async () => {
    work.mockReset().mockResolvedValue({ id: 1 });
    const { status, json, response } = await send(post);
    expect([status, json]).toEqual([201, { id: 1 }]);
    expect(response.headers.get("cache-control")).toBe("no-store");
    expect(response.headers.get("x-request-id")).toMatch(/^[0-9a-f-]{36}$/);
  });

  it.each([
    ["no origin", { origin: null }],
    ["a null origin", { origin: "null" }],
    ["another origin", { origin: "http://localhost:3001" }],
    ["our origin with more", { origin: `${origin}.example.org` }],
    ["another scheme", { origin: "https://localhost:3000" }],
    ["another site", { "sec-fetch-site": "cross-site" }],
    ["a neighbouring site", { "sec-fetch-site": "same-site" }],
  ])("is refused with %s before anything is read", async (_what, headers) => {
    work.mockReset();
    const { status, json } = await send(post, { headers });
    expect([status, json?.type]).toEqual([403, "urn:ebbmark:wrong-origin"]);
    expect(work).not.toHaveBeenCalled();
  });

  it.each([
    "text/plain",
    "application/x-www-form-urlencoded",
    "multipart/form-data; boundary=x",
    "application/json; charset=latin1",
    null,
  ])("is refused as %s", async (type) => {
    expect((await send(post, { headers: { "content-type": type } })).status).toBe(415);
  });

  it("takes JSON with its charset named", async () => {
    work.mockReset().mockResolvedValue({});
    expect((await send(post, { headers: { "content-type": "application/json; charset=UTF-8" } })).status).toBe(201);
  });

  it("may be 256 KiB and no more, whatever length it claims", async () => {
    const body = JSON.stringify({ title: "x".repeat(largestBody) });
    expect((await send(post, { body })).status).toBe(413);
    expect((await send(post, { headers: { "content-length": String(largestBody + 1) } })).status).toBe(413);
  });

  it.each([
    ["no JSON", "{title", ""],
    ["a key twice", '{"title":"a","title":"b"}', "title"],
    ["an unknown key", '{"title":"a","more":1}', ""],
    ["an empty title", '{"title":""}', "title"],
    ["a wrong row", '{"title":"a","rows":[{"n":1},{"n":"2"}]}', "rows[1].n"],
  ])("is refused with %s, and names the place", async (_what, body, path) => {
    const { status, json } = await send(post, { body });
    expect([status, json?.type]).toEqual([422, "urn:ebbmark:invalid-request"]);
    expect(json?.problems?.[0]?.path).toBe(path);
  });

  it("refuses a part of the address that is no plain word", async () => {
    for (const id of ["../x", "a b", "%00", "x".repeat(81), ""])
      expect((await send(post, { params: { screeningId: id } })).status).toBe(404);
  });
});

describe("the person at the door", () => {
  it("must be signed in", async () => {
    viewer = null;
    expect((await send(post)).json?.type).toBe("urn:ebbmark:not-signed-in");
  });
  it("must have chosen a password of their own, save where that is done", async () => {
    viewer = { ...viewer, mustChangePassword: true };
    expect((await send(post)).json?.type).toBe("urn:ebbmark:must-change-password");
    work.mockReset().mockResolvedValue(undefined);
    const change = defineRoute({ act: "account.change", evenIfPasswordMustChange: true, work: async () => work() });
    expect((await send(change)).status).toBe(204);
  });
  it("must have a role that has the act, before the body is read", async () => {
    for (const role of ["approver", "auditor", "administrator"] satisfies Role[]) {
      viewer = { ...viewer, role };
      expect((await send(post, { body: "{" })).json?.type).toBe("urn:ebbmark:not-allowed");
    }
  });
  it("may be a stranger at an open door", async () => {
    viewer = null;
    const open = defineOpenRoute({ act: "health.read", work: async () => ({ status: "ok" }) });
    expect((await send(open, { method: "GET" })).json).toEqual({ status: "ok" });
  });
});

describe("an answer", () => {
  it("to a read needs no origin, and its query is checked", async () => {
    work.mockReset().mockResolvedValue([]);
    expect((await send(get, { method: "GET", headers: { origin: null, "content-type": null } })).status).toBe(200);
    expect((await send(get, { method: "GET", query: "?limit=10" })).json?.problems?.[0]?.path).toBe("limit");
    expect((await send(get, { method: "GET", query: "?other=1" })).status).toBe(422);
  });

  it("to a refusal is problem details with the time to wait", async () => {
    work.mockReset().mockRejectedValue(new Refusal("busy", { retryAfterS: 10, detail: "Wait a little." }));
    const { response, json } = await send(post);
    expect(response.headers.get("content-type")).toBe("application/problem+json");
    expect(response.headers.get("retry-after")).toBe("10");
    expect(json).toMatchObject({
      type: "urn:ebbmark:busy",
      status: 503,
      detail: "Wait a little.",
      requestId: response.headers.get("x-request-id"),
    });
  });

  it("to a fault of ours tells its reference and nothing else", async () => {
    work.mockReset().mockRejectedValue(new Error("select * from app.credential where secret"));
    const { status, json } = await send(post);
    expect([status, json?.type]).toEqual([500, "urn:ebbmark:unexpected"]);
    expect(JSON.stringify(json)).not.toMatch(/select|credential|\.ts|at /);
  });

  it("to a database that is away says to try again", async () => {
    work.mockReset().mockRejectedValue(Object.assign(new Error("connect"), { code: "ECONNREFUSED" }));
    expect((await send(post)).json).toMatchObject({ type: "urn:ebbmark:record-unavailable", status: 503 });
  });

  it("may carry a cookie", async () => {
    work.mockReset().mockResolvedValue(
      new Answer(
        { ok: true },
        {
          headers: [
            ["set-cookie", "a=1"],
            ["set-cookie", "b=2"],
          ],
        },
      ),
    );
    expect((await send(post)).response.headers.getSetCookie()).toEqual(["a=1", "b=2"]);
  });
});

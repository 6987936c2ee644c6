import "server-only";
import type { z } from "zod";
import type { Problem } from "@/contracts/refusals";
import { ruleFor, type Act, type OpenAct } from "./auth/matrix";
import { cookieOf } from "./auth/cookie";
import { viewerFromCookie, type Viewer } from "./auth/viewer";
import { Answer } from "./door-answer";
import { problemFor, problemsOf } from "./door-problem";
import { readBody } from "./door-body";
import { env } from "./env";
import { asRefusal } from "./ledger/as-refusal";
import { logLine } from "./log-lines";
import { Refusal } from "./refusal";

export type Handler = ((request: Request, context: { params: Promise<Record<string, string>> }) => Promise<Response>) & {
  /** The acts behind the address; the table of addresses is checked against them. */
  acts: readonly (Act | OpenAct)[];
};

type Shapes<Body, Query> = {
  /** Shape of the JSON body. Required wherever a method changes something and has a body. */
  body?: z.ZodType<Body>;
  /** Shape of the query string. */
  query?: z.ZodType<Query>;
  status?: number;
};

type Asked<Body, Query> = { body: Body; query: Query; params: Record<string, string>; request: Request };

/**
 * The one door to the server for a signed-in person: origin, session, role, shape, then the work, which authorises with the matter in hand.
 * Refusals become problem details; anything unexpected becomes a reference, and its cause a line in the log.
 */
export function defineRoute<Body = undefined, Query = undefined>(
  route: Shapes<Body, Query> & {
    act: Act | readonly Act[];
    evenIfPasswordMustChange?: true;
    work: (viewer: Viewer, asked: Asked<Body, Query>) => Promise<unknown>;
  },
): Handler {
  const acts = typeof route.act === "string" ? [route.act] : route.act;
  return handler(acts, async (request, params) => {
    const viewer = await viewerFromCookie(cookieOf(request));
    if (!viewer) throw new Refusal("not-signed-in");
    if (viewer.mustChangePassword && !route.evenIfPasswordMustChange) throw new Refusal("must-change-password");
    const { role } = viewer;
    if (role === "system" || acts.every((act) => ruleFor(act, role) === "-")) throw new Refusal("not-allowed");
    const asked = await read(route, request, params);
    return { viewer, result: await route.work(viewer, asked), status: route.status };
  });
}

/** A door for strangers: sign-in and health. */
export function defineOpenRoute<Body = undefined, Query = undefined>(
  route: Shapes<Body, Query> & { act: OpenAct; work: (asked: Asked<Body, Query>) => Promise<unknown> },
): Handler {
  return handler([route.act], async (request, params) => {
    const asked = await read(route, request, params);
    return { viewer: null, result: await route.work(asked), status: route.status };
  });
}

type Outcome = { viewer: Viewer | null; result: unknown; status: number | undefined };

function handler(acts: Handler["acts"], serve: (request: Request, params: Record<string, string>) => Promise<Outcome>): Handler {
  const handle = async (request: Request, context: { params: Promise<Record<string, string>> }): Promise<Response> => {
    const requestId = crypto.randomUUID();
    const started = performance.now();
    let who: string | null = null;
    let response: Response;
    try {
      checkOrigin(request);
      const { viewer, result, status } = await serve(request, (await context.params) ?? {});
      who = viewer?.id ?? null;
      response = toResponse(result, status);
    } catch (error) {
      response = refuse(error, requestId);
    }
    response.headers.set("x-request-id", requestId);
    response.headers.set("cache-control", "no-store");
    logLine().info(
      {
        requestId,
        method: request.method,
        path: new URL(request.url).pathname,
        status: response.status,
        person: who,
        ms: Math.round(performance.now() - started),
      },
      "request",
    );
    return response;
  };
  return Object.assign(handle, { acts });
}

/** A change must come from our own pages: exact origin, and no other site or frame where the browser says so. */
function checkOrigin(request: Request): void {
  if (request.method === "GET" || request.method === "HEAD") return;
  const site = request.headers.get("sec-fetch-site");
  if (request.headers.get("origin") !== env().origin || (site !== null && site !== "same-origin"))
    throw new Refusal("wrong-origin");
}

async function read<Body, Query>(
  route: Shapes<Body, Query>,
  request: Request,
  params: Record<string, string>,
): Promise<Asked<Body, Query>> {
  for (const [name, value] of Object.entries(params)) {
    if (!/^[\w-]{1,80}$/.test(value)) throw new Refusal("not-found", { detail: `There is no such ${name}.` });
  }
  const body = route.body ? parse(route.body, await readBody(request)) : (undefined as Body);
  const query = route.query ? parse(route.query, Object.fromEntries(new URL(request.url).searchParams)) : (undefined as Query);
  return { body, query, params, request };
}

function parse<T>(schema: z.ZodType<T>, value: unknown): T {
  const parsed = schema.safeParse(value);
  if (parsed.success) return parsed.data;
  throw new Refusal("invalid-request", { problems: problemsOf(parsed.error) });
}

function toResponse(result: unknown, status = 200): Response {
  if (result instanceof Answer) return result.toResponse();
  return result === undefined ? new Response(null, { status: 204 }) : Response.json(result, { status });
}

function refuse(error: unknown, requestId: string): Response {
  const expected = expectedRefusal(error);
  if (!expected) logLine().error({ requestId, err: error }, "unexpected error");
  const problem: Problem = problemFor(expected, requestId);
  const headers = new Headers({ "content-type": "application/problem+json" });
  if (expected?.parts.retryAfterS) headers.set("retry-after", String(expected.parts.retryAfterS));
  return new Response(JSON.stringify(problem), { status: problem.status, headers });
}

/** Our own refusals and those of the record. A database that can't be reached is no fault of the request either. */
function expectedRefusal(error: unknown): Refusal | undefined {
  const known = asRefusal(error);
  return known instanceof Refusal ? known : undefined;
}

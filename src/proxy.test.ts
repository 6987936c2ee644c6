import { createHash } from "node:crypto";
import { NextRequest } from "next/server";
import { afterEach, describe, expect, it, vi } from "vitest";
import { contentSecurityPolicy, proxy } from "./proxy";

const ask = (url: string, host: string, headers: Record<string, string> = {}) =>
  proxy(new NextRequest(url, { headers: { host, ...headers } }));

afterEach(() => vi.unstubAllEnvs());

describe("the one address", () => {
  it("sends a bare address to localhost at the same port, path and query kept", () => {
    vi.stubEnv("EBBMARK_ORIGIN", undefined);
    const answer = ask("http://127.0.0.1:3210/log?entry=7", "127.0.0.1:3210");
    expect(answer.status).toBe(308);
    expect(answer.headers.get("location")).toBe("http://localhost:3210/log?entry=7");
  });

  it("prefers the origin that the installation names", () => {
    vi.stubEnv("EBBMARK_ORIGIN", "http://localhost:3000");
    expect(ask("http://127.0.0.1:3000/", "127.0.0.1:3000").headers.get("location")).toBe("http://localhost:3000/");
  });

  it("leaves localhost where it is", () => {
    expect(ask("http://localhost:3000/desk", "localhost:3000").status).toBe(200);
  });

  it("never redirects in a circle when the bare address is the origin", () => {
    vi.stubEnv("EBBMARK_ORIGIN", "http://127.0.0.1:3000");
    expect(ask("http://127.0.0.1:3000/desk", "127.0.0.1:3000").status).toBe(200);
  });
});

describe("the page's own address", () => {
  const told = (url: string, headers = {}) =>
    ask(url, "localhost", headers).headers.get("x-middleware-request-x-ebbmark-address");
  it("is told to the page with its query, without the framework's own mark", () => {
    expect(told("http://localhost/log?entry=7&_rsc=1x2")).toBe("/log?entry=7");
    expect(told("http://localhost/desk?_rsc=1x2")).toBe("/desk");
  });
  it("is never what the browser claims", () => {
    expect(told("http://localhost/desk", { "x-ebbmark-address": "//elsewhere.invalid" })).toBe("/desk");
  });
});

describe("the content policy", () => {
  it("carries a fresh nonce for every answer and passes it to the page", () => {
    const nonceOf = () =>
      /'nonce-([^']+)'/.exec(ask("http://localhost/", "localhost").headers.get("content-security-policy") ?? "")?.[1];
    const first = nonceOf();
    expect(first).toMatch(/^[A-Za-z0-9+/]{22}==$/);
    expect(nonceOf()).not.toBe(first);
  });

  it("allows neither eval nor inline styles outside development", () => {
    const policy = contentSecurityPolicy("n", false);
    expect(policy).not.toContain("unsafe-inline");
    expect(policy).not.toContain("unsafe-eval");
    // The one style attribute let in is React's own, by its hash.
    const hidden = createHash("sha256").update("display:none").digest("base64");
    expect(policy).toContain(`style-src 'self' 'nonce-n' 'unsafe-hashes' 'sha256-${hidden}';`);
    expect(policy).toContain("default-src 'none'");
    expect(policy).toContain("frame-ancestors 'none'");
    expect(contentSecurityPolicy("n", true)).toContain("'unsafe-eval'");
  });

  it("forbids framing, sniffing and caching of what a person was shown", () => {
    const { headers } = ask("http://localhost/", "localhost");
    expect(headers.get("x-frame-options")).toBe("DENY");
    expect(headers.get("x-content-type-options")).toBe("nosniff");
    expect(headers.get("cache-control")).toBe("no-store");
  });

  it("drops headers that only the framework may send", () => {
    const answer = ask("http://localhost/", "localhost", { "next-action": "x", "x-middleware-subrequest": "middleware" });
    const overridden = answer.headers.get("x-middleware-override-headers") ?? "";
    expect(overridden).not.toContain("next-action");
    expect(overridden).not.toContain("x-middleware-subrequest");
    expect(overridden).toContain("x-nonce");
  });
});

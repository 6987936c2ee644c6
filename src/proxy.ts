import { NextResponse, type NextRequest } from "next/server";
import { addressHeader } from "@/server/auth/address-header";

/**
 * Headers of every page and answer, and the one address of the product. It decides nothing about who may do what: that is asked where a
 * page reads and where a route handler writes, because a proxy can be walked around.
 */
export function proxy(request: NextRequest): NextResponse {
  const elsewhere = canonicalAddress(request);
  if (elsewhere) return NextResponse.redirect(elsewhere, 308);

  const nonce = Buffer.from(crypto.getRandomValues(new Uint8Array(16))).toString("base64");
  const policy = contentSecurityPolicy(nonce, process.env.NODE_ENV === "development");

  // Next reads the nonce of its own scripts from the policy on the request.
  const forwarded = new Headers(request.headers);
  forwarded.set("x-nonce", nonce);
  forwarded.set("content-security-policy", policy);
  forwarded.set(addressHeader, addressOf(request));
  // Only the framework itself sends these; from outside they have been ways past a check.
  forwarded.delete("x-middleware-subrequest");
  forwarded.delete("next-action");

  const response = NextResponse.next({ request: { headers: forwarded } });
  response.headers.set("content-security-policy", policy);
  for (const [name, value] of Object.entries(securityHeaders)) response.headers.set(name, value);
  response.headers.set("cache-control", "no-store");
  if (process.env.EBBMARK_ORIGIN?.startsWith("https:")) {
    response.headers.set("strict-transport-security", "max-age=31536000; includeSubDomains");
  }
  return response;
}

/** Path and query of the page, without the mark by which the framework asks for a page's data. */
function addressOf({ nextUrl }: NextRequest): string {
  const query = new URLSearchParams(nextUrl.searchParams);
  query.delete("_rsc");
  return nextUrl.pathname + (query.size > 0 ? `?${query}` : "");
}

export const config = { matcher: ["/((?!_next/static|_next/image|icon.svg|favicon.ico).*)"] };

/**
 * Where a request by bare address belongs. Passkeys and cookies are bound to a host name, so the product has one:
 * the host of EBBMARK_ORIGIN, or localhost at the same port.
 */
function canonicalAddress(request: NextRequest): URL | null {
  const host = request.headers.get("host") ?? "";
  const address = /^(?:127\.0\.0\.1|\[::1\])(?::(\d+))?$/.exec(host);
  if (!address) return null;

  const port = address[1];
  const origin = process.env.EBBMARK_ORIGIN ?? `http://localhost${port ? `:${port}` : ""}`;
  if (new URL(origin).host === host) return null;
  return new URL(request.nextUrl.pathname + request.nextUrl.search, origin);
}

/**
 * SHA-256 of "display:none": React hides a streamed piece of a drawing with just this attribute until its place is ready. No other style
 * attribute is let in.
 */
const hiddenSegment = "sha256-aqNNdDLnnrDOnTNdkJpYlAxKVJtLt9CtFLklmInuUAE=";

/** Scripts and styles of our own only. Development needs eval and inline styles for its overlay and hot reload; the product never does. */
export function contentSecurityPolicy(nonce: string, development: boolean): string {
  const directives = {
    "default-src": "'none'",
    "script-src": `'self' 'nonce-${nonce}' 'strict-dynamic'${development ? " 'unsafe-eval'" : ""}`,
    "style-src": development ? "'self' 'unsafe-inline'" : `'self' 'nonce-${nonce}' 'unsafe-hashes' '${hiddenSegment}'`,
    "img-src": "'self' data:",
    "font-src": "'self'",
    "connect-src": development ? "'self' ws:" : "'self'",
    "worker-src": development ? "'self' blob:" : "'self'",
    "manifest-src": "'self'",
    "form-action": "'self'",
    "base-uri": "'none'",
    "frame-ancestors": "'none'",
    "object-src": "'none'",
  };
  return Object.entries(directives)
    .map(([name, value]) => `${name} ${value}`)
    .join("; ");
}

const securityHeaders = {
  "x-content-type-options": "nosniff",
  "x-frame-options": "DENY",
  "referrer-policy": "same-origin",
  "cross-origin-opener-policy": "same-origin",
  "cross-origin-resource-policy": "same-origin",
  "permissions-policy": "camera=(), microphone=(), geolocation=(), payment=(), usb=(), display-capture=()",
};

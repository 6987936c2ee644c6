import "server-only";
import type { z } from "zod";
import { refusals, type Problem } from "@/contracts/refusals";
import type { Refusal } from "./refusal";

/** Problem details of a refusal; without one, of a fault of our own, which tells nothing but its reference. */
export function problemFor(refusal: Refusal | undefined, requestId: string): Problem {
  if (!refusal) {
    return {
      type: "urn:ebbmark:unexpected",
      title: "Something went wrong on our side. Nothing was half written.",
      status: 500,
      detail: `Try again. If it happens again, report the reference ${requestId}.`,
      requestId,
    };
  }
  const { code, parts } = refusal;
  const { title, status } = refusals[code];
  return {
    type: `urn:ebbmark:${code}`,
    title,
    status,
    ...(parts.detail ? { detail: parts.detail } : {}),
    requestId,
    ...(parts.problems ? { problems: parts.problems } : {}),
    ...(parts.current === undefined ? {} : { current: parts.current }),
  };
}

/** `remarks[0].text`, and for a key that does not belong: the place it stands in. */
export function problemsOf(error: z.ZodError): { path: string; message: string }[] {
  return error.issues.map(({ path, message }) => ({
    path: path.reduce<string>(
      (at, key) => (typeof key === "number" ? `${at}[${key}]` : at ? `${at}.${String(key)}` : String(key)),
      "",
    ),
    message,
  }));
}

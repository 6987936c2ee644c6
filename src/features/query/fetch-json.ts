import type { Problem } from "@/contracts/refusals";
import { RefusedError, UnreachableError } from "./refused-error";

type Options = { method: "GET" | "POST" | "PUT" | "DELETE"; body?: unknown; signal?: AbortSignal; keepalive?: boolean };

/**
 * Asks an address of the API.
 *
 * Returns  the answer; undefined where there is none to give (204)
 * Throws   RefusedError for a "no" with its problem; UnreachableError when no answer came; AbortError when `signal` was used
 */
export async function fetchJson<T>(endpoint: string, { method, body, signal, keepalive }: Options): Promise<T> {
  let response: Response;
  try {
    response = await fetch(endpoint, {
      method,
      headers: { accept: "application/json", ...(body === undefined ? {} : { "content-type": "application/json" }) },
      credentials: "same-origin",
      cache: "no-store",
      ...(body === undefined ? {} : { body: JSON.stringify(body) }),
      ...(signal ? { signal } : {}),
      ...(keepalive ? { keepalive } : {}),
    });
    if (response.status === 204) return undefined as T;
    const answer: unknown = await response.json();
    if (response.ok) return answer as T;
    if (isProblem(answer)) throw new RefusedError(answer);
  } catch (error) {
    if (error instanceof RefusedError || (error instanceof DOMException && error.name === "AbortError")) throw error;
    throw new UnreachableError({ cause: error });
  }
  // Something between us and the server answered in its place.
  throw new UnreachableError({ cause: `status ${response.status}` });
}

export const getJson = <T>(endpoint: string, signal?: AbortSignal) =>
  fetchJson<T>(endpoint, { method: "GET", ...(signal ? { signal } : {}) });
export const postJson = <T>(endpoint: string, body: unknown) => fetchJson<T>(endpoint, { method: "POST", body });
export const putJson = <T>(endpoint: string, body: unknown) => fetchJson<T>(endpoint, { method: "PUT", body });
export const deleteJson = (endpoint: string) => fetchJson<undefined>(endpoint, { method: "DELETE" });

const isProblem = (answer: unknown): answer is Problem =>
  typeof answer === "object" && answer !== null && "type" in answer && String(answer.type).startsWith("urn:ebbmark:");

import "server-only";
import { Refusal } from "./refusal";

/** The PostgreSQL error inside whatever the query builder wrapped it in. */
export function databaseErrorOf(
  error: unknown,
): { code: string; constraint?: string; message: string; detail?: string } | undefined {
  for (let at: unknown = error, depth = 0; at instanceof Error && depth < 5; at = at.cause, depth++) {
    const { code, constraint, message, detail } = at as Error & { code?: unknown; constraint?: string; detail?: string };
    if (typeof code === "string") return { code, constraint, message, detail };
  }
  return undefined;
}

/** Turns a broken unique constraint into a refusal that names the field. Rethrows everything else. */
export const alreadyExists =
  (constraint: string, path: string, message: string) =>
  (error: unknown): never => {
    const cause = databaseErrorOf(error);
    if (cause?.code === "23505" && cause.constraint === constraint) {
      throw new Refusal("already-exists", { detail: message, problems: [{ path, message }] });
    }
    throw error;
  };

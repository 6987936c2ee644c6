import type { z } from "zod";

export type SearchParams = Record<string, string | string[] | undefined>;

/**
 * The part of an address's query that a filter knows and can use. Empty fields of a form, unknown keys and values that fit no filter are
 * left out: a list is shown all the same.
 */
export function filterFrom<S extends z.ZodObject>(schema: S, params: SearchParams): Partial<z.infer<S>> {
  const kept: Record<string, string> = {};
  for (const key of Object.keys(schema.shape)) {
    const value = params[key];
    if (typeof value === "string" && value.trim() !== "" && schema.safeParse({ [key]: value }).success) kept[key] = value;
  }
  const parsed = schema.safeParse(kept);
  return parsed.success ? parsed.data : {};
}

/** An address with those of its query that say something. */
export function withQuery(path: string, query: Record<string, string | number | undefined>): string {
  const given = Object.entries(query).flatMap(([key, value]) =>
    value === undefined || value === "" ? [] : [[key, String(value)]],
  );
  return given.length > 0 ? `${path}?${new URLSearchParams(given).toString()}` : path;
}

import { Refusal } from "@/server/refusal";

/** What a read found; null where the viewer's role has no such page at all, which is then said in words. */
export async function allowed<T>(read: Promise<T>): Promise<{ found: T } | null> {
  try {
    return { found: await read };
  } catch (error) {
    if (error instanceof Refusal && error.code === "not-allowed") return null;
    throw error;
  }
}

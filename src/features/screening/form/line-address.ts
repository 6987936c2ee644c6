import type { LineKey } from "@/contracts/lines/line";
import { parts } from "@/contracts/lines/parts";
import { parseLineKey } from "@/contracts/lines/registry";
import { pages } from "@/contracts/paths";

/** Address of a line in its part of the form. */
export function lineAddress(screeningId: string, key: LineKey): string {
  const part = parts.find((one) => one.part === parseLineKey(key)?.line.part) ?? parts[0];
  return pages.part(screeningId, part.slug, key);
}

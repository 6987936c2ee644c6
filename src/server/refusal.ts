import "server-only";
import { refusals, type RefusalCode } from "@/contracts/refusals";

export type RefusalParts = {
  /** One more sentence than the code's own. */
  detail?: string;
  problems?: { path: string; message: string }[];
  retryAfterS?: number;
  /** What stands in the way, for the caller to show beside its own (the draft as the other saved it). */
  current?: unknown;
};

/** An expected "no", out of the closed list. Anything else that is thrown is our own fault and answered as such. */
export class Refusal extends Error {
  override readonly name = "Refusal";

  constructor(
    readonly code: RefusalCode,
    readonly parts: RefusalParts = {},
  ) {
    super(parts.detail ?? refusals[code].title);
  }
}

/** What a read found; a refusal when it found nothing that is open to the viewer. */
export function orNotFound<T>(found: T | null): T {
  if (found === null) throw new Refusal("not-found");
  return found;
}

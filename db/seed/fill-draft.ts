import { newDraft, type DraftDocument, type Source } from "@/contracts/draft";
import { parseLineKey } from "@/contracts/lines/registry";

/** A line as somebody would type it: figure or word, unit, where it comes from. */
export type Typed = readonly [key: string, typed: string, unit?: string, source?: Source];

export const demoSheet = (note: string): Source => ({ kind: "sheet", note: `demo: ${note}` });
export const demoAssumption = (note: string): Source => ({ kind: "assumed", note: `demo: ${note}` });

/** A draft with these lines filled in as typed. SI values are derived when it is saved, as for everybody. */
export function fillDraft(title: string, lines: readonly Typed[], composition: DraftDocument["composition"]): DraftDocument {
  const draft = newDraft(title);
  for (const [key, typed, unit, source] of lines) {
    const line = parseLineKey(key)?.line;
    if (!line) throw new RangeError(`there is no line ${key}`);
    draft.lines[key] = { typed, unit: unit ?? null, si: null, source: source ?? null };
  }
  return { ...draft, composition };
}

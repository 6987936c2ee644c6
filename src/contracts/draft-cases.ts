/** Adding and removing cases of a draft. A letter is given once: what was typed under it may stand in a record, so it never means another case. */
import { withInitials, type CaseKind, type DraftDocument } from "./draft";
import { parseLineKey } from "./lines/registry";

/** The letter after every one that a case or a line of the draft has ever had. Undefined after Z. */
export function nextLetter({ cases, lines }: DraftDocument): string | undefined {
  const used = [...cases.map(({ letter }) => letter), ...Object.keys(lines).flatMap((key) => parseLineKey(key)?.letter ?? [])];
  const last = used.reduce((latest, letter) => (letter > latest ? letter : latest), "@");
  return last >= "Z" ? undefined : String.fromCharCode(last.charCodeAt(0) + 1);
}

/**
 * A new case with the lines of another one, sources included. A fire case starts with a pool fire on the wetted area, or with a surface fire
 * where the vessel has no shape to tell what is wetted.
 */
export function addCase(
  draft: DraftDocument,
  kind: CaseKind,
  like: string,
): { draft: DraftDocument; letter: string } | undefined {
  const letter = nextLetter(draft);
  if (!letter) return undefined;
  const copied = Object.entries(withInitials(draft).lines).flatMap(([key, value]) =>
    parseLineKey(key)?.letter === like ? [[`${letter}${key.slice(1)}`, value] as const] : [],
  );
  const lines: DraftDocument["lines"] = { ...draft.lines, ...Object.fromEntries(copied) };
  if (kind === "fire-blowdown") {
    const shaped = draft.lines["2.02-1"]?.typed !== "volume";
    lines[`${letter}6.02`] = { typed: shaped ? "pool-fire" : "surface-fire", unit: null, si: null, source: null };
  }
  return { draft: { ...draft, cases: [...draft.cases, { letter, kind }], lines }, letter };
}

/** Its lines stay in the draft, out of sight, so that its letter stays given. The last case can't be removed. */
export function removeCase(draft: DraftDocument, letter: string): DraftDocument {
  const left = draft.cases.filter((one) => one.letter !== letter);
  return left.length === 0 ? draft : { ...draft, cases: left };
}

/** "Two acknowledgements are missing: C3 and C4." Null when none is. */
export function missingAcknowledgements(cautions: readonly { id: string }[], acknowledged: ReadonlySet<string>): string | null {
  const missing = cautions.filter(({ id }) => !acknowledged.has(id)).map(({ id }) => id);
  if (missing.length === 0) return null;
  return missing.length === 1
    ? `One acknowledgement is missing: ${missing[0]}.`
    : `${counts[missing.length] ?? missing.length} acknowledgements are missing: ${missing.slice(0, -1).join(", ")} and ${missing.at(-1)}.`;
}

const counts = ["", "One", "Two", "Three", "Four", "Five", "Six", "Seven", "Eight", "Nine"];

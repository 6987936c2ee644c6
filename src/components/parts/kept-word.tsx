/** Whether the lines are kept. `at` and `since` are times of day as shown ("14:32:08", "14:36"). */
export type Keeping =
  | { state: "kept"; at: string }
  | { state: "keeping" }
  | { state: "not-kept"; since: string }
  | { state: "conflict" }
  | { state: "untouched" };

/** State of the autosave in words; a change is read out, politely. `label` adds "Kept" where no cell says it already. */
export function KeptWord({ keeping, label = false }: { keeping: Keeping; label?: boolean }) {
  return (
    <span
      role="status"
      className={keeping.state === "not-kept" || keeping.state === "conflict" ? "font-semibold text-beyond" : undefined}
    >
      {wordsOf(keeping, label)}
    </span>
  );
}

function wordsOf(keeping: Keeping, label: boolean): string {
  switch (keeping.state) {
    case "kept":
      return label ? `Kept ${keeping.at}` : keeping.at;
    case "keeping":
      return "Keeping…";
    case "not-kept":
      return `Not kept since ${keeping.since}`;
    case "conflict":
      return "Changed elsewhere";
    case "untouched":
      return label ? "Nothing to keep yet" : "–";
  }
}

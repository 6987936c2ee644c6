/** What checking an entry found. Recomputed in the reader's own browser; before that it is not checked. */
export type Seal = "holds" | "witnessed" | "broken" | "not-checked";

const seals: Record<Seal, { word: string; ink: string }> = {
  holds: { word: "Seal holds", ink: "text-within" },
  witnessed: { word: "Witnessed", ink: "text-tide" },
  broken: { word: "Seal broken", ink: "text-beyond" },
  "not-checked": { word: "Not checked", ink: "text-ink-3" },
};

/** Two links of the chain and a word; the links stand apart where the seal is broken, and dashed where nobody looked. */
export function SealWord({ seal, children }: { seal: Seal; children?: string }) {
  const { word, ink } = seals[seal];
  return (
    <span className={`whitespace-nowrap text-note leading-[1.4] phone:whitespace-normal ${ink}`}>
      <svg
        width="16"
        height="16"
        viewBox="0 0 16 16"
        fill="none"
        stroke="currentColor"
        strokeWidth="1.7"
        aria-hidden="true"
        className="mr-[7px] align-[-.14em]"
      >
        <rect
          x={seal === "broken" ? 0.9 : 1.5}
          y="5"
          width={seal === "broken" ? 5.6 : 7}
          height="6"
          rx="3"
          strokeDasharray={seal === "not-checked" ? "2 1.6" : undefined}
        />
        <rect
          x={seal === "broken" ? 9.5 : 7.5}
          y="5"
          width={seal === "broken" ? 5.6 : 7}
          height="6"
          rx="3"
          strokeDasharray={seal === "not-checked" ? "2 1.6" : undefined}
        />
        {seal === "broken" && <path d="M6.4 13.5l3.2-11" strokeWidth="1.2" />}
      </svg>
      {children ?? word}
    </span>
  );
}

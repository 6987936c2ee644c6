/** Where a revision stands. The rules of the sign count the signatures to come and given. */
export type RecordState = "draft" | "computed" | "signed" | "countersigned" | "returned" | "superseded" | "withdrawn";

const states: Record<RecordState, { word: string; drawing: string; dashed?: true }> = {
  draft: { word: "In draft", drawing: "M2 11h10", dashed: true },
  computed: { word: "Computed", drawing: "M2 11h10" },
  signed: { word: "Signed, awaiting countersign", drawing: "M2 8h10M2 11h10" },
  countersigned: { word: "Countersigned", drawing: "M2 5h10M2 8h10M2 11h10" },
  returned: { word: "Returned with remarks", drawing: "M2 11h10M9 7H3l2.5-3M3 7l2.5 3" },
  superseded: { word: "Superseded", drawing: "M2 11h10M3 3l8 6" },
  withdrawn: { word: "Withdrawn", drawing: "M2 11h10M3 3l8 6M11 3l-8 6" },
};

/** Sign and word of a state. */
export function StateWord({ state }: { state: RecordState }) {
  const { word, drawing, dashed } = states[state];
  return (
    <span className="whitespace-nowrap text-note leading-[1.4] phone:whitespace-normal">
      <svg
        width="15"
        height="15"
        viewBox="0 0 14 14"
        fill="none"
        stroke="currentColor"
        strokeWidth="1.7"
        aria-hidden="true"
        className="mr-[7px] align-[-.14em]"
      >
        <path d={drawing} strokeDasharray={dashed ? "2 2" : undefined} />
      </svg>
      {word}
    </span>
  );
}

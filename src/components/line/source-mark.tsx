import type { ReactNode } from "react";

/** What a value rests on; `missing` where nothing has been said yet. */
export type SourceKind = "sheet" | "measured" | "derived" | "assumed" | "missing";

export const sourceWords: Record<SourceKind, string> = {
  sheet: "Sheet",
  measured: "Measured",
  derived: "Derived",
  assumed: "Assumed",
  missing: "No source",
};

const marks: Record<SourceKind, { ink: string; drawing: ReactNode }> = {
  sheet: { ink: "text-ink", drawing: <rect x="2" y="2" width="9" height="9" fill="currentColor" /> },
  measured: { ink: "text-ink", drawing: <circle cx="6.5" cy="6.5" r="5" fill="currentColor" /> },
  derived: { ink: "text-tide", drawing: <path d="M2 11.5L6.5 2 11 11.5z" fill="none" stroke="currentColor" strokeWidth="1.5" /> },
  assumed: {
    ink: "text-near",
    drawing: <path d="M6.5 1L12 6.5 6.5 12 1 6.5z" fill="none" stroke="currentColor" strokeWidth="1.5" />,
  },
  missing: {
    ink: "text-beyond",
    drawing: (
      <rect x="2" y="2" width="9" height="9" fill="none" stroke="currentColor" strokeWidth="1.5" strokeDasharray="2 1.6" />
    ),
  },
};

/** The shape of a source. Always beside its word; a lone mark in the margin gets `titled`. */
export function SourceMark({ kind, titled = false }: { kind: SourceKind; titled?: boolean }) {
  const { ink, drawing } = marks[kind];
  return (
    <svg
      width="13"
      height="13"
      viewBox="0 0 13 13"
      className={`relative top-px flex-none ${ink}`}
      {...(titled ? { role: "img", "aria-label": sourceWords[kind] } : { "aria-hidden": true })}
    >
      {drawing}
    </svg>
  );
}

import type { ReactNode } from "react";

/** Heading in the margin. */
export function MarginHead({ children }: { children: ReactNode }) {
  return <h2 className="mb-2.5 mt-6 text-sub first:mt-0">{children}</h2>;
}

/**
 * A note in the margin.
 *
 * no     line or caution it cites, set before the words
 * mark   a `<SourceMark />` before the number
 */
export function MarginNote({
  no,
  mark,
  caution,
  children,
}: {
  no?: string;
  mark?: ReactNode;
  caution?: boolean;
  children: ReactNode;
}) {
  return (
    <p className="border-t py-[9px] font-serif text-note text-ink-2">
      {mark} {no && <b className={`mr-1.5 font-num text-label leading-none ${caution ? "text-near" : "text-ink"}`}>{no}</b>}
      {children}
    </p>
  );
}

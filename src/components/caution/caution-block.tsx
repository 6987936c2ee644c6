import { useId, type ReactNode } from "react";
import { WarningSign } from "../line/warning-sign";

/** A standing caution in the words that are stored with the signature. `id` is what acknowledgements and the record cite ("C1"). */
export type Caution = { id: string; words: ReactNode };

/**
 * The cautions that stand with a result: after the limits, before the charts, never folded.
 *
 * also   names of cautions that stand beside what they concern, with their links
 */
export function CautionBlock({
  cautions,
  title = "Cautions that stand with this result",
  also,
}: {
  cautions: readonly Caution[];
  title?: ReactNode;
  also?: ReactNode;
}) {
  const titleId = useId();
  return (
    <div className="my-[18px]">
      <section
        aria-labelledby={titleId}
        className="unbroken border-b border-t-2 border-near bg-near-wash px-[18px] py-3.5 print:border-1.5 print:border-ink"
      >
        <h2 id={titleId} className="mb-1.5 flex items-center gap-[9px] text-sub text-near">
          <WarningSign size={18} />
          {title}
        </h2>
        <ul className="grid grid-cols-[repeat(auto-fit,minmax(min(100%,250px),1fr))] gap-x-[26px]">
          {cautions.map(({ id, words }) => (
            <li
              key={id}
              className="grid max-w-[72ch] grid-cols-[minmax(26px,auto)_1fr] items-baseline gap-x-2 py-1 font-serif text-body leading-[1.42]"
            >
              <b className="font-num text-label text-near">{id}</b>
              <span>{words}</span>
            </li>
          ))}
        </ul>
      </section>
      {also && <p className="pt-2 text-small text-ink-2">{also}</p>}
    </div>
  );
}

/** One caution beside what it concerns. */
export function CautionNote({ id, words }: Caution) {
  return (
    <p className="pt-1.5 font-serif text-body text-ink-2">
      <b className="mr-1.5 font-num text-label text-near">{id}</b>
      {words}
    </p>
  );
}

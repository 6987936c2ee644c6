import type { RecordContent } from "@/contracts/record-content";

/** Doubts that the engine has about a run, in its own sentences. */
export function Warnings({ cases }: { cases: RecordContent["cases"] }) {
  const all = cases.flatMap(({ letter, warnings }) => warnings.map((warning) => ({ letter, ...warning })));
  if (all.length === 0) return null;
  return (
    <section aria-labelledby="warnings">
      <h2 id="warnings" className="mb-1">
        Warnings of the run
      </h2>
      <ul className="border-t">
        {all.map(({ letter, code, message }, index) => (
          <li key={index} className="border-b py-2 font-serif text-prose text-ink-2">
            {cases.length > 1 && <b className="font-num text-label">Case {letter} </b>}
            {message} <span className="font-cond text-label text-ink-3">{code}</span>
          </li>
        ))}
      </ul>
    </section>
  );
}

import Link from "next/link";
import { formatUtc } from "@/components/quantity/format-time";
import { MarginHead } from "@/components/shell/margin";
import { StateWord } from "@/components/verdict/state-word";
import { pages } from "@/contracts/paths";
import type { ScreeningView } from "@/contracts/views";

/** Every revision of a screening, newest first, the one on this page marked. */
export function Revisions({ screening }: { screening: ScreeningView }) {
  return (
    <>
      <MarginHead>Revisions</MarginHead>
      <ul className="border-t">
        {screening.revisions.map(({ rev, state, changedAt }) => (
          <li key={rev} className="border-b py-2" aria-current={rev === screening.rev || undefined}>
            <b>
              {rev === screening.rev ? (
                `Rev ${rev}, this sheet`
              ) : (
                <Link href={pages.screening(screening.id, rev)}>Rev {rev}</Link>
              )}
            </b>
            <span className="block">
              <StateWord state={state} />
            </span>
            <span className="block text-label text-ink-3">{formatUtc(changedAt)} UTC</span>
          </li>
        ))}
      </ul>
    </>
  );
}

import { TitleBlock } from "@/components/shell/title-block";
import { StateWord } from "@/components/verdict/state-word";
import type { ScreeningView } from "@/contracts/views";
import { recordTitle } from "./record-title";

/** Which record this is, and where it stands. On phones it folds to one line that opens. */
export function RecordTitleBlock({ screening }: { screening: ScreeningView }) {
  const { record, rev, section, state } = screening;
  const block = <TitleBlock cells={[...recordTitle(screening), { label: "State", value: <StateWord state={state} /> }]} />;
  return (
    <>
      <div className="phone:hidden">{block}</div>
      <details className="group hidden phone:block">
        <summary className="flex min-h-[52px] cursor-pointer list-none items-center justify-between gap-3 border-b-3 border-double border-ink px-4 py-1.5 group-open:border-b group-open:border-solid group-open:border-rule">
          <span className="min-w-0">
            <b className="block">
              {record} rev {rev}
            </b>
            <span className="block truncate text-small text-ink-3">
              {section.tag} {section.name}
            </span>
          </span>
          <span className="text-small text-tide underline underline-offset-[.2em]">Details</span>
        </summary>
        {block}
      </details>
    </>
  );
}

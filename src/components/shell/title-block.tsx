import type { ReactNode } from "react";

/**
 * One cell of the title block.
 *
 * wide   takes the room that is left (Section, Case); on phones these come first
 */
export type TitleCell = { label: string; value: ReactNode; wide?: boolean };

/** Ruled cells under the strip that say which record this is; closed by a double rule, as what is settled is. */
export function TitleBlock({ cells }: { cells: readonly TitleCell[] }) {
  return (
    <dl className="flex flex-wrap border-b-3 border-double border-ink">
      {cells.map(({ label, value, wide }) => (
        <div
          key={label}
          className={`min-w-[92px] border-r px-5 pb-2 pt-[7px] last:border-r-0 phone:min-w-0 phone:border-b phone:px-4 phone:py-1.5 ${
            wide ? "flex-1 phone:-order-1 phone:flex-[1_0_45%]" : "phone:flex-[1_0_30%]"
          }`}
        >
          <dt className="text-label font-medium leading-[1.2] text-ink-3">{label}</dt>
          <dd className="whitespace-nowrap text-[1.0625rem] font-semibold leading-[1.3] phone:whitespace-normal phone:text-body">
            {value}
          </dd>
        </div>
      ))}
    </dl>
  );
}

import type { ReactNode } from "react";
import { ShareBar } from "./share-bar";
import type { Verdict } from "./verdict";
import { VerdictWord } from "./verdict-word";

/**
 * One limit as shown. Texts are formatted by the caller, who knows the units and never rounds across a verdict.
 *
 * no         line it stands on, with the case's letter ("A7.02"); an en dash where it has none
 * computed   "−27.2 °C", or null when nothing was computed
 * limit      "not below −29.0 °C", or null when none was entered
 * inHand     distance left, in the limit's unit ("1.8 K"); null when there is none
 * share      computed over limit [-] for the bar; null draws none
 * note       beside the distance: share left, or the near band ("band 10 K")
 */
export type LimitRow = {
  no: string;
  title: ReactNode;
  computed: ReactNode | null;
  limit: ReactNode | null;
  inHand: ReactNode | null;
  note?: ReactNode;
  share: number | null;
  verdict: Verdict;
  governs: boolean;
};

const rowOf: Record<Verdict, string> = {
  within: "governs by-within",
  near: "governs by-near",
  beyond: "governs by-beyond",
  open: "governs by-open",
};
const govern: Record<Verdict, string> = { within: "text-ink-2", near: "text-near", beyond: "text-beyond", open: "text-ink-2" };

/** The limits of a result, the governing one washed, barred and labelled; closed by a double rule. Phones show each as a block. */
export function LimitTable({ rows, caption }: { rows: readonly LimitRow[]; caption?: string }) {
  return (
    <table className="ruled stack limits settled [&_td]:py-2">
      {caption && <caption className="sr-only">{caption}</caption>}
      <thead>
        <tr>
          <th scope="col" className="w-[52px]">
            Line
          </th>
          <th scope="col">Limit</th>
          <th scope="col" className="numeric">
            Computed
          </th>
          <th scope="col" className="numeric">
            Limit value
          </th>
          <th scope="col" className="w-[160px] phone:hidden" aria-hidden="true">
            Share of limit used
          </th>
          <th scope="col" className="numeric">
            In hand
          </th>
          <th scope="col" className="w-[118px] !pl-[18px]">
            Verdict
          </th>
        </tr>
      </thead>
      <tbody>
        {/* Limits that physics sets have no line of their own; the title tells them apart. */}
        {rows.map((row, at) => (
          <tr
            key={at}
            {...(row.no === "–" ? {} : { id: `limit-${row.no}` })}
            className={row.governs ? rowOf[row.verdict] : undefined}
          >
            <td className="line-no">{row.no}</td>
            <td className="font-semibold">
              {row.title}
              {row.governs && (
                <span
                  className={`ml-1.5 rounded border border-current px-[5px] py-px text-label font-semibold leading-none phone:ml-0 ${govern[row.verdict]}`}
                >
                  governs
                </span>
              )}
            </td>
            <td className="numeric font-semibold" data-label="Computed">
              {row.computed ?? "not computed"}
            </td>
            <td className="numeric" data-label="Limit">
              {row.limit ?? "no limit entered"}
            </td>
            <td aria-hidden="true" className="phone:hidden">
              {row.share != null && <ShareBar share={row.share} verdict={row.verdict} />}
            </td>
            <td className="numeric" data-label="In hand">
              {row.inHand ?? "–"}
              {row.note && (
                <span className="inline-block min-w-[74px] pl-2.5 text-right text-small text-ink-3 phone:min-w-0">
                  {row.note}
                </span>
              )}
            </td>
            <td className="!pl-[18px] phone:!pl-0">
              <VerdictWord verdict={row.verdict} />
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

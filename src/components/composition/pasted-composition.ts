/** Reads a composition pasted from a report or a spreadsheet: two columns, component and amount. */
import { findComponent, type ListedComponent } from "@/contracts/component-list";
import { molePercentOf } from "@/contracts/derive-si";

export type PastedComponent = {
  written: string;
  typed: string;
  component: ListedComponent | undefined;
  molePercent: number | null;
};

/** Rows of name and amount, apart by a tab, a semicolon or spaces before the last figure. Rows without both are left out. */
export function pastedComposition(text: string): PastedComponent[] {
  return text
    .replace(/\r\n?/g, "\n")
    .split("\n")
    .flatMap((row) => {
      const cells = row.split(/\t|;/).map((cell) => cell.trim());
      const [written, typed] =
        cells.length > 1 ? [cells[0], cells.slice(1).find((cell) => /\d/.test(cell))] : splitAtLastFigure(row);
      if (!written || !typed || !/[a-z]|\d-\d/i.test(written)) return [];
      return [{ written, typed, component: findComponent(written), molePercent: molePercentOf(typed) }];
    });
}

function splitAtLastFigure(row: string): [string | undefined, string | undefined] {
  const match = /^(.*\S)\s+([\d.,]+\s*%?)\s*$/.exec(row.trim());
  return [match?.[1], match?.[2]];
}

/** Reads what is pasted from a spreadsheet: a column of figures for lines, or two columns for a composition. */
import { molePercentOf } from "@/contracts/derive-si";
import { findComponent, type ListedComponent } from "@/contracts/component-list";

/** The cells of the first column, when there is more than one row; undefined for ordinary text. */
export function pastedColumn(text: string): string[] | undefined {
  const rows = text.replace(/\r\n?/g, "\n").replace(/\n+$/, "").split("\n");
  return rows.length > 1 ? rows.map((row) => (row.split("\t")[0] ?? "").trim()) : undefined;
}

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

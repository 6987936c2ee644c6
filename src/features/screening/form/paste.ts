/** Reads what is pasted from a spreadsheet: a column of figures for lines. */

/** The cells of the first column, when there is more than one row; undefined for ordinary text. */
export function pastedColumn(text: string): string[] | undefined {
  const rows = text.replace(/\r\n?/g, "\n").replace(/\n+$/, "").split("\n");
  return rows.length > 1 ? rows.map((row) => (row.split("\t")[0] ?? "").trim()) : undefined;
}

import table from "./data/kij.json";

/** Which published set of binary interaction parameters an equation may use. */
export type InteractionFamily = "PR" | "SRK";

interface PairRow {
  i: string;
  j: string;
  PR: number;
  SRK: number;
  PRbasis: string;
  SRKbasis: string;
}

const pairKey = (a: string, b: string) => (a < b ? `${a}|${b}` : `${b}|${a}`);
const pairs = new Map((table as unknown as { pairs: PairRow[] }).pairs.map((row) => [pairKey(row.i, row.j), row]));

/** k_ij of a pair for a family of equations, with the basis of the number; undefined where the table is silent (k_ij = 0). */
export function libraryInteraction(a: string, b: string, family: InteractionFamily): { kij: number; basis: string } | undefined {
  const row = pairs.get(pairKey(a, b));
  if (!row) return undefined;
  return family === "PR" ? { kij: row.PR, basis: row.PRbasis } : { kij: row.SRK, basis: row.SRKbasis };
}

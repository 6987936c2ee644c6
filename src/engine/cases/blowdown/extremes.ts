/** The lowest or highest value of a quantity over the run, refined between the rows of the series on the fitted run. */
import { smallestBetween } from "../../flow/smallest-between";
import type { Row } from "./series";

export type Extreme = { value: number; timeS: number };

/** A quantity of a row, and the same at another time of the row's piece. */
export type Tracked = { pick: (row: Row) => number; at: (row: Row, t: number) => number };

export function lowest(rows: Row[], { pick, at }: Tracked): Extreme {
  let best = 0;
  const values = rows.map(pick);
  values.forEach((value, i) => {
    if (value < (values[best] ?? Number.POSITIVE_INFINITY)) best = i;
  });
  let found: Extreme = { value: values[best] ?? 0, timeS: rows[best]?.timeS ?? 0 };
  for (const [from, to] of [
    [best - 1, best],
    [best, best + 1],
  ] as const) {
    const [a, b] = [rows[from], rows[to]];
    // Only between rows of one piece; across a phase change the time stands twice.
    if (!a || !b || b.timeS <= a.timeS) continue;
    const span = b.timeS - a.timeS;
    const timeS = a.timeS + span * smallestBetween((part) => at(b, a.timeS + span * part), 0, 1, 1e-4);
    const value = at(b, timeS);
    if (value < found.value) found = { value, timeS };
  }
  return found;
}

export function highest(rows: Row[], { pick, at }: Tracked): Extreme {
  const { value, timeS } = lowest(rows, { pick: (row) => -pick(row), at: (row, t) => -at(row, t) });
  return { value: -value, timeS };
}

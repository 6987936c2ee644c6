/** The lowest or highest value of a quantity over the run, refined between the rows of the series on the dense output. */
import type { Row } from "./series";

export type Extreme = { value: number; timeS: number };

const golden = (Math.sqrt(5) - 1) / 2;

/**
 * rows, values  one value for each row
 * at            the same quantity at a time inside the step of a row
 */
export function lowest(rows: Row[], values: number[], at: (row: Row, t: number) => number): Extreme {
  let best = 0;
  values.forEach((value, i) => {
    if (value < (values[best] ?? Number.POSITIVE_INFINITY)) best = i;
  });
  let found: Extreme = { value: values[best] ?? 0, timeS: rows[best]?.timeS ?? 0 };
  for (const [from, to] of [
    [best - 1, best],
    [best, best + 1],
  ]) {
    const [a, b] = [rows[from ?? -1], rows[to ?? -1]];
    // Only between rows of one step; across a phase change the time stands twice.
    if (!a || !b || b.timeS <= a.timeS) continue;
    const refined = goldenSection((t) => at(b, t), a.timeS, b.timeS);
    if (refined.value < found.value) found = refined;
  }
  return found;
}

export function highest(rows: Row[], values: number[], at: (row: Row, t: number) => number): Extreme {
  const { value, timeS } = lowest(
    rows,
    values.map((one) => -one),
    (row, t) => -at(row, t),
  );
  return { value: -value, timeS };
}

function goldenSection(f: (t: number) => number, from: number, to: number): Extreme {
  let [a, b] = [from, to];
  let c = b - golden * (b - a);
  let d = a + golden * (b - a);
  let fc = f(c);
  let fd = f(d);
  for (let i = 0; i < 24; i++) {
    if (fc < fd) {
      [b, d, fd] = [d, c, fc];
      c = b - golden * (b - a);
      fc = f(c);
    } else {
      [a, c, fc] = [c, d, fd];
      d = a + golden * (b - a);
      fd = f(d);
    }
  }
  return fc < fd ? { value: fc, timeS: c } : { value: fd, timeS: d };
}

/** Value of a column at a time between two of its rows, straight in between; null outside the run. */
export function valueAtTime(timeS: readonly number[], values: readonly number[], atS: number): number | null {
  const after = timeS.findIndex((time) => time >= atS);
  if (after < 0) return null;
  const [t1, y1] = [timeS[after], values[after]];
  const [t0, y0] = [timeS[after - 1], values[after - 1]];
  if (t1 === undefined || y1 === undefined) return null;
  if (t1 === atS) return y1;
  if (t0 === undefined || y0 === undefined) return null;
  return y0 + ((y1 - y0) * (atS - t0)) / (t1 - t0);
}

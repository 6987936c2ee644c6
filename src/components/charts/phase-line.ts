import type { CurveSeries, CurveTone } from "./curve";

export type PhasePoint = { x: number; y: number };

/** A line of a phase diagram, its points in order along it: temperature may turn back on itself. In the units shown. */
export type PhaseLine = { id: string; label: string; tone: CurveTone; points: readonly PhasePoint[] };

/**
 * The line cut where x turns, each piece in rising x, neighbours sharing their end: curves that can be read at an x. The longest piece
 * carries the name.
 */
export function seriesOfLine({ id, label, tone, points }: PhaseLine): CurveSeries[] {
  const pieces = risingPieces(points.filter(({ x, y }) => Number.isFinite(x) && Number.isFinite(y)));
  const named = pieces.reduce((best, piece, i) => (spanOf(piece) > spanOf(pieces[best] ?? []) ? i : best), 0);
  return pieces.map((piece, i) => ({
    id: `${id}-${i}`,
    label,
    tone,
    x: piece.map(({ x }) => x),
    y: piece.map(({ y }) => y),
    ...(i === named ? {} : { quiet: true }),
  }));
}

function risingPieces(points: readonly PhasePoint[]): PhasePoint[][] {
  const pieces: PhasePoint[][] = [];
  let piece: PhasePoint[] = [];
  let way = 0;
  for (const point of points) {
    const last = piece.at(-1);
    const step = last ? Math.sign(point.x - last.x) : 0;
    if (step !== 0 && way !== 0 && step !== way) {
      pieces.push(piece);
      piece = last ? [last] : [];
    }
    if (step !== 0) way = step;
    piece.push(point);
  }
  if (piece.length > 1) pieces.push(piece);
  return pieces.map((one) => ((one[0]?.x ?? 0) > (one.at(-1)?.x ?? 0) ? [...one].reverse() : one));
}

const spanOf = (piece: readonly PhasePoint[]): number => Math.abs((piece.at(-1)?.x ?? 0) - (piece[0]?.x ?? 0));

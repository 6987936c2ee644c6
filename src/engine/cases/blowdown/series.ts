/**
 * The series of a run: ends of steps, both sides of a phase change, and dense output in between, so that neighbours differ by at most
 * 2 % of pressure, 1 K of fluid and wall, 1 % of the start mass and 1 % of the run's duration.
 */
import type { BlowdownSeries } from "../blowdown-result";
import type { Balance } from "./balance";
import type { Segment } from "./integrate-run";
import type { FitPiece } from "./run-fit";
import { levelOf, sampleOf, type Sample } from "./sample";

/** Multiplies the allowed gaps; 1 for a stored run, more for a preview. */
export type Coarseness = number;

export type Row = Sample & { piece: FitPiece };

export function sampleRows(balance: Balance, pieces: readonly FitPiece[], coarseness: Coarseness): Row[] {
  const rows: Row[] = [];
  const durationS = pieces.at(-1)?.t1 ?? 0;
  const hasWall = balance.model.wall !== undefined;
  for (const piece of pieces) {
    const take = (t: number): Row => ({ ...sampleOf(piece, t, hasWall), piece });
    const before = rows.at(-1);
    // Only a jump gives its time twice: a phase change, a path that opens or shuts. Steps and other restarts join smoothly.
    const joins = before && joinsSmoothly(before.piece.segment, piece.segment);
    const first = joins ? before : take(piece.t0);
    if (!joins) rows.push(first);
    const last = take(piece.t1);
    const gap = (a: Sample, b: Sample): number => gapOf(a, b, balance.massScaleKg, durationS) / coarseness;
    fill(first, last, { take, gap, push: (row) => rows.push(row) });
    rows.push(last);
  }
  return rows;
}

const joinsSmoothly = (before: Segment, after: Segment): boolean =>
  before === after || (before.mode === after.mode && before.open.every((open, i) => open === after.open[i]));

/** How many times the allowed gap lies between two samples. */
function gapOf(a: Sample, b: Sample, startMassKg: number, durationS: number): number {
  return Math.max(
    Math.abs(a.pressurePa - b.pressurePa) / (0.02 * Math.min(a.pressurePa, b.pressurePa)),
    Math.abs(a.temperatureK - b.temperatureK),
    Math.abs(a.vapourTemperatureK - b.vapourTemperatureK),
    Math.abs(a.liquidTemperatureK - b.liquidTemperatureK),
    Math.abs((a.wallTemperatureK ?? 0) - (b.wallTemperatureK ?? 0)),
    Math.abs((a.liquidWallTemperatureK ?? 0) - (b.liquidWallTemperatureK ?? 0)),
    Math.abs(a.massKg - b.massKg) / (0.01 * startMassKg),
    Math.abs(a.timeS - b.timeS) / (0.01 * durationS),
  );
}

type Filling = { take: (t: number) => Row; gap: (a: Sample, b: Sample) => number; push: (row: Row) => void };

function fill(a: Row, b: Row, filling: Filling): void {
  const parts = Math.min(Math.ceil(filling.gap(a, b) * 1.02), 100);
  if (parts <= 1 || b.timeS - a.timeS < 1e-12 * b.timeS) return;
  let before = a;
  for (let k = 1; k <= parts; k++) {
    const next = k === parts ? b : filling.take(a.timeS + ((b.timeS - a.timeS) * k) / parts);
    fill(before, next, filling);
    if (k < parts) filling.push(next);
    before = next;
  }
}

export function seriesOf(balance: Balance, rows: Row[]): BlowdownSeries {
  const { wall } = balance.model;
  const twoPhase = rows.some((row) => row.piece.segment.mode !== "one-phase");
  const column = (pick: (row: Row) => number): number[] => rows.map(pick);
  const wallColumn = wall
    ? {
        gasWallTemperatureK: column((row) => row.wallTemperatureK ?? 0),
        liquidWallTemperatureK: column((row) => row.liquidWallTemperatureK ?? 0),
      }
    : {};
  const levels = twoPhase ? rows.map((row) => levelOf(balance, row)) : [];
  return {
    timeS: column((row) => row.timeS),
    pressurePa: column((row) => row.pressurePa),
    fluidTemperatureK: column((row) => row.temperatureK),
    vapourTemperatureK: column((row) => row.vapourTemperatureK),
    ...(twoPhase ? { liquidTemperatureK: column((row) => row.liquidTemperatureK) } : {}),
    ...wallColumn,
    massKg: column((row) => row.massKg),
    ventRateKgPerS: column((row) => row.ventRateKgPerS),
    ventedMassKg: column((row) => row.ventedMassKg),
    ventedEnergyJ: column((row) => row.ventedEnergyJ),
    vapourMoleFraction: column((row) => row.vapourMoleFraction),
    ...(twoPhase && levels.every((level): level is number => level !== undefined) ? { liquidLevelM: levels } : {}),
    outletTemperatureK: column((row) => row.outletTemperatureK),
    ...(balance.model.paths.some((path) => path.hasTailPipe) ? { backPressurePa: column((row) => row.backPressurePa) } : {}),
  };
}

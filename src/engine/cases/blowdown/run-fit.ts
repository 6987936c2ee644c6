/**
 * Everything that a run reports, as functions of time: each step is evaluated at 9 Chebyshev points, at 17 where 9 don't resolve it, and is
 * halved where those don't either. Rows, extremes and the recount of what left are then taken from these functions, not from further flashes.
 *
 * A kink inside a step stops the halving after a few times; the row next to it is then as good as the last halving.
 */
import { EngineError } from "../../errors";
import type { Balance, Instant } from "./balance";
import { cardinal, coarse, fine, integralOf, nearestPlace, unresolved, valueAt } from "./chebyshev";
import type { KeptStep } from "./dense-run";
import type { Run, Segment } from "./integrate-run";

export const quantities = [
  "pressurePa",
  "temperatureK",
  "wallTemperatureK",
  "massKg",
  "ventRateKgPerS",
  "ventedMassKg",
  "ventedEnergyJ",
  "vapourMoleFraction",
  "liquidVolumeM3",
  "throatTemperatureK",
  "outletTemperatureK",
  "enthalpyW",
  "fromWallW",
  "fromOutsideW",
  "backPressurePa",
  "vapourTemperatureK",
  "liquidTemperatureK",
  "liquidWallTemperatureK",
] as const;
export type Quantity = (typeof quantities)[number];
export const indexOf = Object.fromEntries(quantities.map((name, i) => [name, i])) as Record<Quantity, number>;

/** Part of a step: `values[q]` at its Chebyshev points. */
export type FitPiece = { t0: number; t1: number; segment: Segment; step: KeptStep; values: Float64Array[] };

/** Unresolved parts that are let pass: absolute [K], or relative to the largest value in the piece. */
const absolute: Partial<Record<Quantity, number>> = {
  vapourTemperatureK: 1e-3,
  liquidTemperatureK: 1e-3,
  liquidWallTemperatureK: 1e-3,
  wallTemperatureK: 1e-3,
  outletTemperatureK: 5e-3,
};
const relative: Partial<Record<Quantity, number>> = {
  pressurePa: 1e-6,
  ventRateKgPerS: 1e-6,
  enthalpyW: 1e-6,
  fromWallW: 1e-5,
  fromOutsideW: 1e-5,
};
const deepest = 4;

export function fitRun(balance: Balance, run: Run, looseness = 1, isCancelled?: () => boolean): FitPiece[] {
  const pieces: FitPiece[] = [];
  for (const segment of run.segments)
    for (const step of segment.dense.steps) {
      if (isCancelled?.()) throw new EngineError("cancelled", "The calculation was cancelled.", { timeS: step.t0 });
      fitPart(balance, { segment, step, t0: step.t0, t1: step.t1 }, looseness, 0, pieces);
    }
  return pieces;
}

type Part = Omit<FitPiece, "values">;

function fitPart(balance: Balance, part: Part, looseness: number, depth: number, into: FitPiece[]): void {
  const { t0, t1 } = part;
  const span = t1 - t0;
  const at = (place: number): Float64Array => evaluate(balance, part, place === 1 ? t1 : t0 + place * span);
  const kept = depth === 0 ? part.step.samples : undefined;
  const rough = kept ?? Array.from(coarse.places, at);
  const first = transposed(rough);
  if (isResolved(first, looseness)) return void into.push({ ...part, values: first });
  const rows = Array.from(fine.places, (place, j) => (j % 2 === 0 ? rough[j / 2]! : at(place)));
  const second = transposed(rows);
  if (depth >= deepest || isResolved(second, looseness) || !(span > 1e-9 * t1))
    return void into.push({ ...part, values: second });
  const middle = t0 + span / 2;
  fitPart(balance, { ...part, t1: middle }, looseness, depth + 1, into);
  fitPart(balance, { ...part, t0: middle }, looseness, depth + 1, into);
}

const transposed = (rows: Float64Array[]): Float64Array[] => quantities.map((_, q) => Float64Array.from(rows, (row) => row[q]!));

function isResolved(values: Float64Array[], looseness: number): boolean {
  for (const [name, allowed] of Object.entries(absolute) as [Quantity, number][])
    if (unresolved(values[indexOf[name]]!) > allowed * looseness) return false;
  for (const [name, allowed] of Object.entries(relative) as [Quantity, number][]) {
    const column = values[indexOf[name]]!;
    let largest = 0;
    for (const value of column) largest = Math.max(largest, Math.abs(value));
    if (unresolved(column) > allowed * largest * looseness) return false;
  }
  return true;
}

function evaluate(balance: Balance, { segment, step }: Part, t: number): Float64Array {
  const { y, instant } = balance.within(segment, step, t);
  return quantitiesOf(balance, y, instant);
}

/** The quantities of one instant, in their order. */
export function quantitiesOf(balance: Balance, y: readonly number[], instant: Instant): Float64Array {
  const { contents, flow, ventRateKgPerS, enthalpyW, heat } = instant;
  const { fluid } = balance.model;
  return Float64Array.of(
    contents.pressurePa,
    contents.temperatureK,
    heat.innerSurfaceK ?? 0,
    contents.totalMolesMol * fluid.mixtureMolarMass(contents.composition),
    ventRateKgPerS,
    balance.ventedMassKg(y),
    balance.ventedEnergyJ(y),
    contents.vapourMoleFraction,
    contents.liquidVolumeM3,
    flow.throatTemperatureK,
    coldestOutletK(balance, instant),
    enthalpyW,
    heat.fromWallW,
    heat.fromOutsideW,
    flow.backPressurePa,
    contents.lightest.temperatureK,
    contents.equilibrium?.phases[1]?.state.temperatureK ?? contents.temperatureK,
    heat.liquidSurfaceK ?? heat.innerSurfaceK ?? 0,
  );
}

/** Behind the coldest of the openings that pass something; where all are shut, behind the first. */
function coldestOutletK({ model }: Balance, { flow, flows }: Instant): number {
  let coldest = Number.POSITIVE_INFINITY;
  flows.forEach((one, i) => {
    if (one) coldest = Math.min(coldest, model.paths[i]!.throttle.temperatureK(one, one.composition));
  });
  return Number.isFinite(coldest) ? coldest : model.paths[0]!.throttle.temperatureK(flow, flow.composition);
}

/** Labels jump where a dense fluid begins to count as vapour: they are those of the nearest point while one phase is there. */
const labels = [indexOf.vapourMoleFraction, indexOf.liquidVolumeM3];

/** All quantities at one time of a piece. */
export function readPiece(piece: FitPiece, t: number, out: Float64Array): Float64Array {
  const count = piece.values[0]!.length;
  const place = t === piece.t1 ? 1 : (t - piece.t0) / (piece.t1 - piece.t0);
  const shares = cardinal(count, place);
  for (let q = 0; q < quantities.length; q++) {
    const values = piece.values[q]!;
    let sum = 0;
    for (let j = 0; j < count; j++) sum += shares[j]! * values[j]!;
    out[q] = sum;
  }
  if (piece.segment.mode === "one-phase") {
    const nearest = nearestPlace(count, place);
    for (const label of labels) out[label] = piece.values[label]![nearest]!;
  }
  return out;
}

export function pieceAt(piece: FitPiece, quantity: number, t: number): number {
  const values = piece.values[quantity]!;
  const place = t === piece.t1 ? 1 : (t - piece.t0) / (piece.t1 - piece.t0);
  if (piece.segment.mode === "one-phase" && labels.includes(quantity)) return values[nearestPlace(values.length, place)]!;
  return valueAt(values, place);
}

export type Counted = { massKg: number; energyJ: number; fromWallJ: number; fromOutsideJ: number };

/** What left and what heat passed, by quadrature of the rates that the states give; none of the integrator's own sums is in it. */
export function recount(pieces: readonly FitPiece[]): Counted {
  const sum: Counted = { massKg: 0, energyJ: 0, fromWallJ: 0, fromOutsideJ: 0 };
  for (const { t0, t1, values } of pieces) {
    const span = t1 - t0;
    sum.massKg += span * integralOf(values[indexOf.ventRateKgPerS]!);
    sum.energyJ += span * integralOf(values[indexOf.enthalpyW]!);
    sum.fromWallJ += span * integralOf(values[indexOf.fromWallW]!);
    sum.fromOutsideJ += span * integralOf(values[indexOf.fromOutsideW]!);
  }
  return sum;
}

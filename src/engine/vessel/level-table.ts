/**
 * Level and wetted area of a vessel by its liquid volume, fast: a table over θ with h = H (1 − cos θ)/2, in which both are smooth at the ends, and cubic
 * pieces between its points.
 *
 * Holds    volumes to about 1e-6 of the vessel, areas to about 1e-5; where a head joins the shell the area's slope jumps and the nearest pieces are rougher
 * Checks   geometry.test.ts
 */
import type { MeasuredVessel } from "./geometry";

export type Wetted = {
  levelM: number;
  areaM2: number;
  /** d(area)/d(volume) [1/m]. */
  areaRate: number;
  /** d(volume)/d(level): the free surface [m²]. */
  surfaceM2: number;
};

const pieces = 256;

export class LevelTable {
  private readonly volume = new Float64Array(pieces + 1);
  private readonly area = new Float64Array(pieces + 1);
  private readonly heightM: number;

  constructor(private readonly vessel: MeasuredVessel & { below: NonNullable<MeasuredVessel["below"]>; heightM: number }) {
    this.heightM = vessel.heightM;
    for (let k = 0; k <= pieces; k++) {
      const { volumeM3, areaM2 } = vessel.below((vessel.heightM * (1 - Math.cos((Math.PI * k) / pieces))) / 2);
      this.volume[k] = volumeM3;
      this.area[k] = areaM2;
    }
  }

  at(liquidVolumeM3: number): Wetted {
    const { volume, area, heightM } = this;
    const V = Math.min(Math.max(liquidVolumeM3, 0), this.vessel.volumeM3);
    let low = 0;
    let high = pieces;
    while (high - low > 1) {
      const middle = (low + high) >> 1;
      if (volume[middle]! <= V) low = middle;
      else high = middle;
    }
    const [v0, v1] = [volume[low]!, volume[low + 1]!];
    const [d0, d1] = [slopeAt(volume, low), slopeAt(volume, low + 1)];
    let s = v1 > v0 ? (V - v0) / (v1 - v0) : 0;
    for (let i = 0; i < 8; i++) {
      const slope = cubicSlope(s, v0, v1, d0, d1);
      if (!(slope > 0)) break;
      const step = (cubic(s, v0, v1, d0, d1) - V) / slope;
      s = Math.min(Math.max(s - step, 0), 1);
      if (Math.abs(step) < 1e-13) break;
    }
    const [a0, a1] = [area[low]!, area[low + 1]!];
    const [e0, e1] = [slopeAt(area, low), slopeAt(area, low + 1)];
    const theta = (Math.PI * (low + s)) / pieces;
    const perPiece = Math.max(cubicSlope(s, v0, v1, d0, d1), 1e-300);
    const risePerPiece = (heightM / 2) * Math.sin(theta) * (Math.PI / pieces);
    return {
      levelM: (heightM * (1 - Math.cos(theta))) / 2,
      areaM2: cubic(s, a0, a1, e0, e1),
      areaRate: cubicSlope(s, a0, a1, e0, e1) / perPiece,
      surfaceM2: risePerPiece > 0 ? perPiece / risePerPiece : 0,
    };
  }
}

/** Central difference at a point of the table, one-sided and flat to second order at its ends (both columns are even in θ there). */
const slopeAt = (column: Float64Array, k: number): number =>
  k === 0 || k === pieces ? 0 : (column[k + 1]! - column[k - 1]!) / 2;

const cubic = (s: number, y0: number, y1: number, d0: number, d1: number): number =>
  y0 + s * (d0 + s * (3 * (y1 - y0) - 2 * d0 - d1 + s * (d0 + d1 - 2 * (y1 - y0))));
const cubicSlope = (s: number, y0: number, y1: number, d0: number, d1: number): number =>
  d0 + s * (2 * (3 * (y1 - y0) - 2 * d0 - d1) + 3 * s * (d0 + d1 - 2 * (y1 - y0)));

const tables = new WeakMap<MeasuredVessel, LevelTable>();

/** The table of a vessel with a known shape, made once. */
export function levelTable(vessel: MeasuredVessel): LevelTable | undefined {
  const { below, heightM } = vessel;
  if (!below || heightM === undefined) return undefined;
  let table = tables.get(vessel);
  if (!table) tables.set(vessel, (table = new LevelTable({ ...vessel, below, heightM })));
  return table;
}

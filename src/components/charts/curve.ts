/** What a chart of curves shows. All numbers are in the units shown; a chart converts nothing. */

/** The job of a curve: sets colour, weight and dash on screen and on paper. */
export type CurveTone = "pressure" | "fluid" | "wall" | "outer-wall" | "vent" | "ghost" | "second-look";

/**
 * One curve.
 *
 * x[i], y[i]   points in rising x; a y that is not finite leaves a gap
 * label        stands at the curve itself, in its colour; a ghost may go without ("")
 */
export type CurveSeries = { id: string; label: string; tone: CurveTone; x: readonly number[]; y: readonly number[] };

/** A limit, dashed, its words at the line: at a height (`axis: "y"`) or at a moment (`axis: "x"`). */
export type CurveLimit = { axis: "x" | "y"; at: number; label: string };

/** A point that matters, with value and time in words ("−27.2 °C at 21.4 min"). */
export type CurveMark = { x: number; y: number; label: string };

/**
 * An axis.
 *
 * name, unit   "pressure" and "bar(g)"
 * min, max     fixed ends; two panels that share time are given the same
 * fromZero     starts at zero, as pressure does
 * format       writes a value at reading precision; three figures unless said
 */
export type CurveAxis = {
  name: string;
  unit: string;
  min?: number;
  max?: number;
  fromZero?: boolean;
  format?: (value: number) => string;
};

export type Curves = {
  x: CurveAxis;
  y: CurveAxis;
  series: readonly CurveSeries[];
  limits?: readonly CurveLimit[];
  marks?: readonly CurveMark[];
};

export type Ground = "sheet" | "tint";

type Look = { colour: string; width: number; dash: number[]; printDash?: number[] };

export const curveLooks: Record<CurveTone, Look> = {
  pressure: { colour: "--c-pressure", width: 2.8, dash: [] },
  fluid: { colour: "--c-fluid", width: 2.4, dash: [], printDash: [8, 3, 2, 3] },
  wall: { colour: "--c-wall", width: 2.8, dash: [] },
  "outer-wall": { colour: "--c-wall", width: 1.6, dash: [2, 3] },
  vent: { colour: "--c-vent", width: 2.4, dash: [] },
  ghost: { colour: "--c-ghost", width: 1.8, dash: [2, 3] },
  "second-look": { colour: "--ink", width: 1.6, dash: [2, 3] },
};

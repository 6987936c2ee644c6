/** What a chart of curves shows. All numbers are in the units shown; a chart converts nothing. */

/** The job of a curve: sets colour, weight and dash on screen and on paper. */
export type CurveTone =
  | ("pressure" | "fluid" | "liquid" | "wall" | "liquid-wall" | "outer-wall" | "vent" | "ghost" | "second-look")
  // Lines of a phase diagram.
  | ("bubble" | "dew" | "share" | "hydrate" | "frost");

/**
 * One curve.
 *
 * x[i], y[i]   points in rising x; a y that is not finite leaves a gap
 * label        stands at the curve itself, in its colour; a ghost may go without ("")
 * quiet        the label is read, not drawn: a further piece of a line that is named already
 */
export type CurveSeries = {
  id: string;
  label: string;
  tone: CurveTone;
  x: readonly number[];
  y: readonly number[];
  quiet?: boolean;
};

/** A shaded band between two curves over the same x, drawn behind everything: a spread. It has the colour of its tone. */
export type CurveBand = { id: string; tone: CurveTone; x: readonly number[]; low: readonly number[]; high: readonly number[] };

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
 * log          steps of ten take the same height; values must be above zero
 * format       writes a value at reading precision; three figures unless said
 */
export type CurveAxis = {
  name: string;
  unit: string;
  min?: number;
  max?: number;
  fromZero?: boolean;
  log?: boolean;
  format?: (value: number) => string;
};

export type Curves = {
  x: CurveAxis;
  y: CurveAxis;
  series: readonly CurveSeries[];
  bands?: readonly CurveBand[];
  limits?: readonly CurveLimit[];
  marks?: readonly CurveMark[];
};

export type Ground = "sheet" | "tint";

/** `words` is the colour of the label where that of the line is too faint for text. */
type Look = { colour: string; width: number; dash: number[]; printDash?: number[]; words?: string };

export const curveLooks: Record<CurveTone, Look> = {
  pressure: { colour: "--c-pressure", width: 2.8, dash: [] },
  fluid: { colour: "--c-fluid", width: 2.4, dash: [], printDash: [8, 3, 2, 3] },
  liquid: { colour: "--c-fluid", width: 2.4, dash: [9, 4] },
  wall: { colour: "--c-wall", width: 2.8, dash: [] },
  "liquid-wall": { colour: "--c-wall", width: 2.8, dash: [9, 4] },
  "outer-wall": { colour: "--c-wall", width: 1.6, dash: [2, 3] },
  vent: { colour: "--c-vent", width: 2.4, dash: [] },
  ghost: { colour: "--c-ghost", width: 1.8, dash: [2, 3] },
  "second-look": { colour: "--ink", width: 1.6, dash: [2, 3] },
  bubble: { colour: "--c-pressure", width: 2.8, dash: [] },
  dew: { colour: "--c-pressure", width: 2, dash: [9, 3] },
  share: { colour: "--c-ghost", width: 1.2, dash: [], words: "--ink-3" },
  hydrate: { colour: "--c-vent", width: 1.8, dash: [2, 3] },
  frost: { colour: "--c-wall", width: 1.8, dash: [6, 3, 1.5, 3] },
};

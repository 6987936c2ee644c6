import type { Chart, Plugin } from "chart.js";
import { axisTitle } from "./axis-scale";
import { drawWords, fontOf, inkOf } from "./canvas-ink";
import { curveLooks, type Curves, type Ground } from "./curve";
import {
  leaderTo,
  placeLabels,
  placesAlong,
  placesAround,
  placesAtLevel,
  placesAtPost,
  type Box,
  type LabelToPlace,
  type Point,
} from "./place-labels";

/** What the plugin draws over the curves. `readingX` is where the reading post stands, in units of x. */
export type CurveDrawing = Curves & { ground: Ground; readingX: number | null };

/** Kept beside the chart, because Chart.js would wrap it in proxies and call what looks like a function if it were an option. */
const drawings = new WeakMap<Chart, CurveDrawing>();

export function setCurveDrawing(chart: Chart, drawing: CurveDrawing): void {
  drawings.set(chart, drawing);
}

/** Axis names, limits, posts, marked points, direct labels and the reading post. */
export const curvePlugin: Plugin<"line"> = {
  id: "ebbmark-curves",
  beforeDatasetsDraw(chart) {
    const drawing = drawings.get(chart as Chart);
    if (!drawing?.bands) return;
    const paper = paperOf(chart as Chart, drawing);
    chart.ctx.save();
    drawBands(paper);
    chart.ctx.restore();
  },
  afterDatasetsDraw(chart) {
    const drawing = drawings.get(chart as Chart);
    if (!drawing) return;
    const paper = paperOf(chart as Chart, drawing);
    chart.ctx.save();
    drawBaseLine(paper);
    drawLimits(paper);
    drawReading(paper);
    drawMarks(paper);
    drawLabels(paper);
    drawAxisNames(paper);
    chart.ctx.restore();
  },
};

type Paper = {
  drawing: CurveDrawing;
  context: CanvasRenderingContext2D;
  area: Box;
  width: number;
  height: number;
  ink: (variable: string) => string;
  ground: string;
  toX: (value: number) => number;
  toY: (value: number) => number;
};

function paperOf(chart: Chart, drawing: CurveDrawing): Paper {
  const { x, y } = chart.scales;
  const ink = (variable: string) => inkOf(chart.canvas, variable);
  return {
    drawing,
    context: chart.ctx,
    area: chart.chartArea,
    width: chart.width,
    height: chart.height,
    ink,
    ground: ink(`--${drawing.ground}`),
    toX: (value) => x?.getPixelForValue(value) ?? 0,
    toY: (value) => y?.getPixelForValue(value) ?? 0,
  };
}

function drawBands({ drawing, context, area, ink, toX, toY }: Paper): void {
  context.beginPath();
  context.rect(area.left, area.top, area.right - area.left, area.bottom - area.top);
  context.clip();
  context.globalAlpha = 0.2;
  for (const { tone, x, low, high } of drawing.bands ?? []) {
    context.fillStyle = ink(curveLooks[tone].colour);
    context.beginPath();
    x.forEach((at, i) => context.lineTo(toX(at), toY(high[i] ?? Number.NaN)));
    for (let i = x.length - 1; i >= 0; i--) context.lineTo(toX(x[i] ?? Number.NaN), toY(low[i] ?? Number.NaN));
    context.closePath();
    context.fill();
  }
  context.globalAlpha = 1;
}

function drawBaseLine({ context, area, ink }: Paper): void {
  context.strokeStyle = ink("--ink");
  context.lineWidth = 1.2;
  context.beginPath();
  context.moveTo(area.left, area.bottom);
  context.lineTo(area.right, area.bottom);
  context.stroke();
}

function drawLimits({ drawing, context, area, ink, toX, toY }: Paper): void {
  context.strokeStyle = ink("--c-limit");
  context.lineWidth = 1.5;
  context.setLineDash([7, 4]);
  for (const { axis, at } of drawing.limits ?? []) {
    context.beginPath();
    if (axis === "x") {
      context.moveTo(toX(at), area.top);
      context.lineTo(toX(at), area.bottom);
    } else {
      context.moveTo(area.left, toY(at));
      context.lineTo(area.right, toY(at));
    }
    context.stroke();
  }
  context.setLineDash([]);
}

function drawMarks({ drawing, context, ink, ground, toX, toY }: Paper): void {
  for (const mark of drawing.marks ?? []) drawRing(context, { x: toX(mark.x), y: toY(mark.y) }, { line: ink("--ink"), ground });
}

function drawReading({ drawing, context, area, ink, ground, toX, toY }: Paper): void {
  if (drawing.readingX === null) return;
  const x = toX(drawing.readingX);
  context.strokeStyle = ink("--ink-3");
  context.lineWidth = 1;
  context.beginPath();
  context.moveTo(x, area.top);
  context.lineTo(x, area.bottom);
  context.stroke();
  for (const series of drawing.series) {
    const value = valueAt(series, drawing.readingX);
    if (value !== null) drawRing(context, { x, y: toY(value) }, { line: ink(curveLooks[series.tone].colour), ground });
  }
}

function drawRing(context: CanvasRenderingContext2D, { x, y }: Point, { line, ground }: { line: string; ground: string }): void {
  context.beginPath();
  context.arc(x, y, 4.5, 0, 2 * Math.PI);
  context.fillStyle = ground;
  context.fill();
  context.lineWidth = 2;
  context.strokeStyle = line;
  context.stroke();
}

function drawLabels({ drawing, context, area, ink, ground, toX, toY }: Paper): void {
  context.font = fontOf(600);
  context.textAlign = "center";
  context.textBaseline = "middle";
  const sizeOf = (words: string) => ({ width: context.measureText(words).width, height: 17 });
  const curves = drawing.series.map((series) => pixelsOf(series, toX, toY));
  const limits = drawing.limits ?? [];

  const labels: (LabelToPlace & { words: string; colour: string; point?: Point })[] = [
    ...limits.map(({ axis, at, label }) => {
      const size = sizeOf(label);
      const places = axis === "y" ? placesAtLevel(toY(at), area, size) : placesAtPost(toX(at), area, size);
      return { ...size, places, words: label, colour: ink("--c-limit") };
    }),
    ...(drawing.marks ?? []).map((mark) => {
      const size = sizeOf(mark.label);
      const point = { x: toX(mark.x), y: toY(mark.y) };
      return { ...size, places: placesAround(point, size), words: mark.label, colour: ink("--ink"), point };
    }),
    ...drawing.series.flatMap((series, own) => {
      if (series.label === "" || series.quiet) return [];
      const size = sizeOf(series.label);
      const look = curveLooks[series.tone];
      const colour = ink(look.words ?? look.colour);
      return [{ ...size, places: placesAlong(curves[own] ?? [], size), own, words: series.label, colour }];
    }),
  ];

  const boxes = placeLabels(labels, {
    area,
    curves,
    levels: limits.filter(({ axis }) => axis === "y").map(({ at }) => toY(at)),
    posts: limits.filter(({ axis }) => axis === "x").map(({ at }) => toX(at)),
  });
  labels.forEach(({ words, colour, point }, index) => {
    const box = boxes[index];
    const leader = box && point && leaderTo(point, box);
    if (leader) drawLeader(context, point, leader, colour);
    if (box) drawWords(context, words, { x: (box.left + box.right) / 2, y: (box.top + box.bottom) / 2 }, { colour, ground });
  });
}

/** From the rim of the ring to the label. */
function drawLeader(context: CanvasRenderingContext2D, from: Point, to: Point, colour: string): void {
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  context.strokeStyle = colour;
  context.lineWidth = 1;
  context.beginPath();
  context.moveTo(from.x + ((to.x - from.x) * 6) / length, from.y + ((to.y - from.y) * 6) / length);
  context.lineTo(to.x, to.y);
  context.stroke();
}

function drawAxisNames({ drawing, context, area, height, ink }: Paper): void {
  context.font = fontOf(400);
  context.fillStyle = ink("--ink-3");
  context.textBaseline = "alphabetic";
  context.textAlign = "left";
  context.fillText(axisTitle(drawing.y), 2, 13);
  context.textAlign = "right";
  context.fillText(axisTitle(drawing.x), area.right, height - 4);
}

/** Pixels of a curve no farther apart than a few, so that it counts as an obstacle along its whole length. */
function pixelsOf(
  { x, y }: { x: readonly number[]; y: readonly number[] },
  toX: (v: number) => number,
  toY: (v: number) => number,
): Point[] {
  const spacing = 4;
  const points: Point[] = [];
  let last: Point | null = null;
  x.forEach((at, i) => {
    const value = y[i];
    if (value === undefined || !Number.isFinite(value)) return;
    const next = { x: toX(at), y: toY(value) };
    if (last) {
      const steps = Math.min(Math.floor(Math.hypot(next.x - last.x, next.y - last.y) / spacing), 400);
      for (let k = 1; k < steps; k += 1) {
        points.push({ x: last.x + ((next.x - last.x) * k) / steps, y: last.y + ((next.y - last.y) * k) / steps });
      }
      if (steps === 0) return;
    }
    points.push(next);
    last = next;
  });
  return points;
}

/** Value of a curve at x, straight between its points; null outside them and in gaps. */
export function valueAt({ x, y }: { x: readonly number[]; y: readonly number[] }, at: number): number | null {
  const after = x.findIndex((candidate) => candidate >= at);
  if (after === -1) return null;
  const [x1 = NaN, y1 = NaN] = [x[after], y[after]];
  if (x1 === at) return Number.isFinite(y1) ? y1 : null;
  if (after === 0) return null;
  const [x0 = NaN, y0 = NaN] = [x[after - 1], y[after - 1]];
  const value = y0 + ((y1 - y0) * (at - x0)) / (x1 - x0);
  return Number.isFinite(value) ? value : null;
}

import type { Chart, Plugin } from "chart.js";
import { formatNumber } from "../quantity/format";
import type { BridgeBar } from "./bridge";
import { drawWords, fontOf, inkOf } from "./canvas-ink";
import type { Ground } from "./curve";

export type BridgeDrawing = { bars: readonly BridgeBar[]; ground: Ground; decimals: number };

const drawings = new WeakMap<Chart, BridgeDrawing>();

export function setBridgeDrawing(chart: Chart, drawing: BridgeDrawing): void {
  drawings.set(chart, drawing);
}

/** Names at the left, a dotted line from bar to bar, the zero line, and each value in its bar or beside it. */
export const bridgePlugin: Plugin<"bar"> = {
  id: "ebbmark-bridge",
  afterDatasetsDraw(chart) {
    const drawing = drawings.get(chart as Chart);
    const { x, y } = chart.scales;
    if (!drawing || !x || !y) return;
    const context = chart.ctx;
    const ink = (variable: string) => inkOf(chart.canvas, variable);
    const rowHeight = drawing.bars.length > 1 ? y.getPixelForValue(1) - y.getPixelForValue(0) : chart.chartArea.height;

    context.save();
    context.strokeStyle = ink("--ink");
    context.lineWidth = 1.2;
    context.beginPath();
    context.moveTo(x.getPixelForValue(0), chart.chartArea.top);
    context.lineTo(x.getPixelForValue(0), chart.chartArea.bottom);
    context.stroke();

    drawing.bars.forEach((bar, row) => {
      const middle = y.getPixelForValue(row);
      const next = drawing.bars[row + 1];
      if (next) {
        const joint = x.getPixelForValue(bar.to);
        context.setLineDash([2, 3]);
        context.beginPath();
        context.moveTo(joint, middle + rowHeight * 0.29);
        context.lineTo(joint, middle + rowHeight * 0.71);
        context.stroke();
        context.setLineDash([]);
      }

      context.textAlign = "left";
      context.textBaseline = "middle";
      context.fillStyle = ink("--ink");
      context.font = fontOf(600);
      context.fillText(bar.kind === "sum" ? `= ${bar.label}` : `${row + 1} ${bar.label}`, 2, bar.note ? middle - 8 : middle);
      if (bar.note) {
        context.font = fontOf(400);
        context.fillStyle = ink("--ink-3");
        context.fillText(bar.note, 14, middle + 9);
      }

      context.font = fontOf(600);
      const words = formatNumber(bar.value, { decimals: drawing.decimals }, { signed: true });
      const width = context.measureText(words).width;
      const [left, right] = [x.getPixelForValue(Math.min(bar.from, bar.to)), x.getPixelForValue(Math.max(bar.from, bar.to))];
      if (right - left > width + 16) {
        context.textAlign = "center";
        context.fillStyle = ink(`--${drawing.ground}`);
        context.fillText(words, (left + right) / 2, middle);
      } else {
        const fitsLeft = left - width - 8 > chart.chartArea.left;
        context.textAlign = fitsLeft ? "right" : "left";
        drawWords(
          context,
          words,
          { x: fitsLeft ? left - 6 : right + 6, y: middle },
          { colour: ink("--ink"), ground: ink(`--${drawing.ground}`) },
        );
      }
    });
    context.restore();
  },
};

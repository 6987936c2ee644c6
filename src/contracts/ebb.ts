import type { BlowdownCase } from "@/engine/cases/blowdown-case";
import type { BlowdownResult } from "@/engine/cases/blowdown-result";
import type { Ebb } from "./views";

const points = 40;

/**
 * The pressure curve of a run as a thumbnail: x over twice the time allowed (over the run where none is set), y over the start pressure, at
 * even steps; the post where the pressure reaches its target, if it does within the width.
 */
export function ebbOf(
  { limits, start }: Pick<BlowdownCase, "limits" | "start">,
  {
    series,
    verdict,
    summary,
  }: Pick<BlowdownResult, "series" | "verdict"> & {
    summary: Pick<BlowdownResult["summary"], "timeToTargetPressureS">;
  },
): Ebb {
  const { timeS, pressurePa } = series;
  const endS = timeS.at(-1) ?? 0;
  const allowedS = limits?.targetTimeS;
  const widthS = allowedS ? 2 * allowedS : endS;
  const reachedS = summary.timeToTargetPressureS;
  const startPa = ("pressurePa" in start ? start.pressurePa : undefined) ?? pressurePa[0] ?? 1;
  const lastS = Math.min(widthS, endS);
  const x = Array.from({ length: points + 1 }, (_, at) => (lastS * at) / points);
  return {
    x: x.map((time) => round(widthS > 0 ? time / widthS : 0)),
    y: x.map((time) => round(interpolate(timeS, pressurePa, time) / startPa)),
    postX: widthS > 0 && reachedS !== undefined && reachedS <= widthS ? round(reachedS / widthS) : null,
    beyond: verdict === "beyond",
  };
}

function interpolate(xs: readonly number[], ys: readonly number[], x: number): number {
  const after = xs.findIndex((one) => one >= x);
  if (after <= 0) return (after === 0 ? ys[0] : ys.at(-1)) ?? 0;
  const [x0 = 0, x1 = 0, y0 = 0, y1 = 0] = [xs[after - 1], xs[after], ys[after - 1], ys[after]];
  return x1 === x0 ? y1 : y0 + ((y1 - y0) * (x - x0)) / (x1 - x0);
}

const round = (value: number): number => Math.round(value * 1e4) / 1e4;

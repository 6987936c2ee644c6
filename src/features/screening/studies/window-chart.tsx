import { useId } from "react";
import { roundTicks } from "@/components/charts/axis-scale";
import { formatNumber } from "@/components/quantity/format";

/** One panel: a figure over the bore. All numbers in the units shown; a value that is absent leaves a gap. */
export type WindowPanel = {
  title: string;
  points: readonly { x: number; y: number | undefined }[];
  limit?: { at: number; label: string };
  tone: "pressure" | "wall";
  fromZero?: boolean;
  chosen?: { y: number; label: string };
};

export type WindowZones = {
  min: number;
  max: number;
  /** Edges of what works; absent where nothing ends it on that side. */
  from?: number;
  to?: number;
  /** What is wrong below `from`. */
  below: "too slow" | "too cold";
  /** Nothing works. */
  none: boolean;
};

const width = 960;
const plot = { left: 52, right: width - 8 };
const panelHeight = { first: 172, second: 186 };
const tops = { first: 30, second: 262 };
const foot = tops.second + panelHeight.second;

/**
 * Two figures over one axis of bores: too small is washed, too cold is washed and hatched, what works lies between; the bore in hand is a post.
 *
 * unit      of the bore, for the axis
 * summary   the finding, for readers by ear
 */
export function WindowChart({
  panels,
  zones,
  bore,
  unit,
  summary,
}: {
  panels: readonly WindowPanel[];
  zones: WindowZones;
  bore: number | undefined;
  unit: string;
  summary: string;
}) {
  const hatch = useId();
  const toX = (value: number) => plot.left + ((value - zones.min) / (zones.max - zones.min)) * (plot.right - plot.left);
  const edges = [zones.from, zones.to].flatMap((edge) => (edge === undefined ? [] : [edge]));
  const ticks = roundTicks(zones.min, zones.max, 6).filter((tick) => edges.every((edge) => Math.abs(toX(edge) - toX(tick)) > 40));
  const shown = panels.slice(0, 2).map((panel, i) => ({
    panel,
    top: i === 0 ? tops.first : tops.second,
    height: i === 0 ? panelHeight.first : panelHeight.second,
  }));
  const bottom = shown.length > 1 ? foot : tops.first + panelHeight.first;
  return (
    <div className="overflow-x-auto" tabIndex={0} role="group" aria-label="Bores that work">
      <svg
        role="img"
        aria-label={summary}
        viewBox={`0 0 ${width} ${bottom + 40}`}
        className="block h-auto w-full min-w-[640px] font-num text-[13px]"
      >
        <defs>
          <pattern id={hatch} width="7" height="7" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
            <path d="M0 0V7" className="stroke-beyond" strokeWidth="1.6" strokeOpacity="0.4" />
          </pattern>
        </defs>
        {shown.map(({ panel, top, height }, i) => (
          <g key={panel.title}>
            <Zones zones={zones} toX={toX} top={top} height={height} hatch={hatch} words={i === 0} />
            <Panel panel={panel} top={top} height={height} toX={toX} bore={bore} />
          </g>
        ))}
        {edges.map((edge) => (
          <g key={edge}>
            {shown.map(({ panel, top, height }) => (
              <path key={panel.title} d={`M${toX(edge)} ${top}v${height}`} className="stroke-ink" strokeWidth="1.5" />
            ))}
            <path d={`M${toX(edge)} ${bottom}v6`} className="stroke-ink" />
            <text x={toX(edge)} y={bottom + 20} textAnchor="middle" className="fill-ink font-semibold">
              {formatNumber(edge, { figures: 3 })}
            </text>
          </g>
        ))}
        {ticks.map((tick) => (
          <g key={tick}>
            <path d={`M${toX(tick)} ${bottom}v5`} className="stroke-ink" />
            <text x={toX(tick)} y={bottom + 20} textAnchor="middle" className="fill-ink-2">
              {formatNumber(tick, { figures: 1 })}
            </text>
          </g>
        ))}
        <text x={plot.right} y={bottom + 36} textAnchor="end" className="fill-ink-3">
          bore, {unit}
        </text>
      </svg>
    </div>
  );
}

function Zones({
  zones: { min, max, from, to, none, below },
  toX,
  top,
  height,
  hatch,
  words,
}: {
  zones: WindowZones;
  toX: (value: number) => number;
  top: number;
  height: number;
  hatch: string;
  words: boolean;
}) {
  const zone = (start: number, end: number, name: "too slow" | "works" | "too cold") => {
    const [x, wide] = [toX(start), toX(end) - toX(start)];
    if (wide <= 0) return null;
    return (
      <g key={`${name}${start}`}>
        <rect x={x} y={top} width={wide} height={height} className={name === "works" ? "fill-within-wash" : "fill-beyond-wash"} />
        {name === "too cold" && <rect x={x} y={top} width={wide} height={height} fill={`url(#${hatch})`} />}
        {words && wide > 64 && (
          <text
            x={x + wide / 2}
            y={top + 17}
            textAnchor="middle"
            className={`font-semibold ${name === "works" ? "fill-within" : "fill-beyond"}`}
          >
            {name}
          </text>
        )}
      </g>
    );
  };
  // Without a window the edges cross: below the one in time nothing is fast enough, above the one of the steel all is too cold.
  const [low, high] = none ? [to ?? max, from ?? min] : [from ?? min, to ?? max];
  return (
    <>
      {zone(min, none ? high : low, below)}
      {!none && zone(low, high, "works")}
      {zone(none ? low : high, max, "too cold")}
    </>
  );
}

function Panel({
  panel,
  top,
  height,
  toX,
  bore,
}: {
  panel: WindowPanel;
  top: number;
  height: number;
  toX: (value: number) => number;
  bore: number | undefined;
}) {
  const clip = useId();
  const values = panel.points.flatMap(({ y }) => (y === undefined ? [] : [y]));
  const all = [...values, ...(panel.limit ? [panel.limit.at] : [])];
  const low = panel.fromZero ? 0 : Math.min(...all);
  // Far past the limit nothing is read off any more.
  const high = panel.fromZero && panel.limit ? Math.min(Math.max(...all), 2.2 * panel.limit.at) : Math.max(...all);
  const ticks = roundTicks(low, high, 4);
  const step = (ticks[1] ?? 1) - (ticks[0] ?? 0) || 1;
  const min = panel.fromZero ? 0 : Math.floor(low / step) * step;
  const max = Math.max(Math.ceil(high / step) * step, min + step);
  const marks = roundTicks(min, max, 5);
  const toY = (value: number) => top + height - ((value - min) / (max - min)) * height;
  const colour = panel.tone === "pressure" ? "stroke-c-pressure" : "stroke-c-wall";
  return (
    <g>
      <clipPath id={clip}>
        <rect x={plot.left} y={top} width={plot.right - plot.left} height={height} />
      </clipPath>
      <text x={2} y={top - 12} className="fill-ink-3">
        {panel.title}
      </text>
      {marks.map((tick) => (
        <g key={tick}>
          <path d={`M${plot.left} ${toY(tick)}H${plot.right}`} className="stroke-rule-2" strokeOpacity="0.7" />
          <text x={plot.left - 8} y={toY(tick) + 4} textAnchor="end" className="fill-ink-2">
            {formatNumber(tick, { decimals: 0, figures: 1 })}
          </text>
        </g>
      ))}
      <path d={`M${plot.left} ${top + height}H${plot.right}`} className="stroke-ink" strokeWidth="1.2" />
      {panel.limit && (
        <>
          <path
            d={`M${plot.left} ${toY(panel.limit.at)}H${plot.right}`}
            className="stroke-c-limit"
            strokeWidth="1.5"
            strokeDasharray="7 4"
          />
          <text
            x={plot.right - 6}
            y={toY(panel.limit.at) - 6}
            textAnchor="end"
            className="fill-c-limit stroke-sheet font-semibold"
            strokeWidth="3.5"
            paintOrder="stroke"
          >
            {panel.limit.label}
          </text>
        </>
      )}
      <g clipPath={`url(#${clip})`}>
        {runsOf(panel.points).map((run) => (
          <path
            key={run[0]?.x}
            d={run.map(({ x, y }, i) => `${i === 0 ? "M" : "L"}${toX(x).toFixed(1)} ${toY(y).toFixed(1)}`).join("")}
            fill="none"
            className={colour}
            strokeWidth="2.6"
            strokeLinejoin="round"
          />
        ))}
      </g>
      {bore !== undefined && (
        <>
          <path d={`M${toX(bore)} ${top}v${height}`} className="stroke-tide" strokeWidth="2.4" />
          {panel.chosen && (
            <>
              <circle cx={toX(bore)} cy={toY(panel.chosen.y)} r="5" className="fill-sheet stroke-tide" strokeWidth="2" />
              <text
                x={toX(bore) + (toX(bore) > width - 120 ? -10 : 10)}
                y={toY(panel.chosen.y) + (toY(panel.chosen.y) > top + height - 30 ? -10 : 20)}
                textAnchor={toX(bore) > width - 120 ? "end" : "start"}
                className="fill-ink stroke-sheet font-semibold"
                strokeWidth="3.5"
                paintOrder="stroke"
              >
                {panel.chosen.label}
              </text>
            </>
          )}
        </>
      )}
    </g>
  );
}

/** Stretches without a gap. */
function runsOf(points: WindowPanel["points"]): { x: number; y: number }[][] {
  const runs: { x: number; y: number }[][] = [[]];
  for (const { x, y } of points) {
    if (y === undefined) runs.push([]);
    else runs.at(-1)?.push({ x, y });
  }
  return runs.filter((run) => run.length > 1);
}

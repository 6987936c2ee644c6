import { roundTicks } from "@/components/charts/axis-scale";
import { formatNumber } from "@/components/quantity/format";

/** Values of one input's low and high end, in the unit shown; an end that gave no figure is absent. */
export type TornadoRow = {
  id: string;
  title: string;
  ends: string;
  low: { value: number | undefined; text: string; past: boolean };
  high: { value: number | undefined; text: string; past: boolean };
};

const width = 760;
const plot = { left: 300, right: width - 16 };
const rowHeight = 44;
const top = 40;

/** Bars from the base line to what each input's low and high end make of a figure, widest first; an end past the limit is said in its colour and bold. */
export function TornadoChart({
  rows,
  base,
  limit,
  unit,
  summary,
}: {
  rows: readonly TornadoRow[];
  base: { at: number; label: string };
  limit?: { at: number; label: string } | undefined;
  unit: string;
  summary: string;
}) {
  const values = rows.flatMap(({ low, high }) => [low.value, high.value]).filter((value) => value !== undefined);
  const all = [...values, base.at, ...(limit ? [limit.at] : [])];
  const room = (Math.max(...all) - Math.min(...all) || 1) * 0.2;
  const [min, max] = [Math.min(...all) - room, Math.max(...all) + room];
  const toX = (value: number) => plot.left + ((value - min) / (max - min)) * (plot.right - plot.left);
  const bottom = top + rows.length * rowHeight;
  // The two words stand on the sides away from each other.
  const limitFirst = limit !== undefined && limit.at < base.at;
  return (
    <div className="overflow-x-auto" tabIndex={0} role="group" aria-label="One input at a time">
      <svg
        role="img"
        aria-label={summary}
        viewBox={`0 0 ${width} ${bottom + 36}`}
        className="block h-auto w-full min-w-[640px] max-w-[860px] font-num text-[13px]"
      >
        {roundTicks(min, max, 5).map((tick) => (
          <g key={tick}>
            <path d={`M${toX(tick)} ${top - 6}V${bottom}`} className="stroke-rule" />
            <text x={toX(tick)} y={bottom + 17} textAnchor="middle" className="fill-ink-2">
              {formatNumber(tick, { decimals: 0, figures: 1 })}
            </text>
          </g>
        ))}
        {rows.map((row, i) => (
          <Bar key={row.id} row={row} y={top + i * rowHeight} baseX={toX(base.at)} toX={toX} />
        ))}
        {limit && (
          <>
            <path
              d={`M${toX(limit.at)} ${top - 10}V${bottom}`}
              className="stroke-c-limit"
              strokeWidth="1.5"
              strokeDasharray="7 4"
            />
            <text
              x={toX(limit.at) + (limitFirst ? -4 : 4)}
              y={top - 16}
              textAnchor={limitFirst ? "end" : "start"}
              className="fill-c-limit font-semibold"
            >
              {limit.label}
            </text>
          </>
        )}
        <path d={`M${toX(base.at)} ${top - 10}V${bottom}`} className="stroke-ink" strokeWidth="1.6" />
        <text
          x={toX(base.at) + (limit && !limitFirst ? -4 : 4)}
          y={top - 16}
          textAnchor={limit && !limitFirst ? "end" : "start"}
          className="fill-ink font-semibold"
        >
          {base.label}
        </text>
        <text x={plot.right} y={bottom + 33} textAnchor="end" className="fill-ink-3">
          {unit}
        </text>
      </svg>
    </div>
  );
}

function Bar({ row, y, baseX, toX }: { row: TornadoRow; y: number; baseX: number; toX: (value: number) => number }) {
  const middle = y + rowHeight / 2;
  const end = (which: "low" | "high") => {
    const { value, text, past } = row[which];
    if (value === undefined) return null;
    const x = toX(value);
    const other = row[which === "low" ? "high" : "low"].value;
    // Where both ends lie on one side, the nearer one's figure stands on the other side of the base line.
    const left = other !== undefined && value !== other ? value < other : x < baseX;
    return (
      <>
        <rect
          x={Math.min(x, baseX)}
          y={middle - 9}
          width={Math.max(Math.abs(x - baseX), 0.5)}
          height="18"
          className={which === "low" ? "fill-c-pressure" : "fill-c-wall"}
          fillOpacity={which === "low" ? 1 : 0.6}
        />
        <text
          x={left ? Math.min(x, baseX) - 6 : Math.max(x, baseX) + 6}
          y={middle + 4}
          textAnchor={left ? "end" : "start"}
          className={`stroke-sheet ${past ? "fill-beyond font-semibold" : "fill-ink"}`}
          strokeWidth="3"
          paintOrder="stroke"
        >
          {text}
        </text>
      </>
    );
  };
  return (
    <g>
      <text x={0} y={middle - 3} className="fill-ink">
        {row.title}
      </text>
      <text x={0} y={middle + 13} className="fill-ink-3">
        {row.ends}
      </text>
      {end("low")}
      {end("high")}
    </g>
  );
}

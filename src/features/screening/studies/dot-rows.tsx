import { roundTicks } from "@/components/charts/axis-scale";
import { formatNumber } from "@/components/quantity/format";

export type DotRow = {
  id: string;
  title: string;
  note: string;
  value: number | undefined;
  text: string;
  kind: "used" | "fit" | "unfit";
};

const width = 560;
const plot = { left: 210, right: width - 60 };
const rowHeight = 42;
const top = 34;

/** One dot a row on one scale: filled for the equation in use, a ring for those that are fit, a cross for those that are not; the band of the fit ones behind. */
export function DotRows({
  rows,
  limit,
  unit,
  summary,
}: {
  rows: readonly DotRow[];
  limit?: { at: number; label: string } | undefined;
  unit: string;
  summary: string;
}) {
  const values = rows.flatMap(({ value }) => (value === undefined ? [] : [value]));
  const [least, most] = [Math.min(...values, ...(limit ? [limit.at] : [])), Math.max(...values, ...(limit ? [limit.at] : []))];
  const room = (most - least || 1) * 0.12;
  const [min, max] = [least - room, most + room];
  const toX = (value: number) => plot.left + ((value - min) / (max - min)) * (plot.right - plot.left);
  const fit = rows.flatMap(({ kind, value }) => (kind === "unfit" || value === undefined ? [] : [value]));
  const bottom = top + rows.length * rowHeight;
  return (
    <div className="overflow-x-auto" tabIndex={0} role="group" aria-label="Each equation">
      <svg
        role="img"
        aria-label={summary}
        viewBox={`0 0 ${width} ${bottom + 34}`}
        className="block h-auto w-full min-w-[480px] max-w-[620px] font-num text-[13px]"
      >
        {fit.length > 1 && (
          <rect
            x={toX(Math.min(...fit))}
            y={top}
            width={Math.max(toX(Math.max(...fit)) - toX(Math.min(...fit)), 1)}
            height={bottom - top}
            className="fill-c-wall"
            fillOpacity="0.2"
          />
        )}
        {roundTicks(min, max, 5).map((tick) => (
          <g key={tick}>
            <path d={`M${toX(tick)} ${top}V${bottom}`} className="stroke-rule" />
            <text x={toX(tick)} y={bottom + 17} textAnchor="middle" className="fill-ink-2">
              {formatNumber(tick, { decimals: 0, figures: 1 })}
            </text>
          </g>
        ))}
        {limit && (
          <>
            <path
              d={`M${toX(limit.at)} ${top - 8}V${bottom}`}
              className="stroke-c-limit"
              strokeWidth="1.5"
              strokeDasharray="7 4"
            />
            <text
              x={toX(limit.at)}
              y={top - 14}
              textAnchor={toX(limit.at) > width - 110 ? "end" : toX(limit.at) < plot.left + 60 ? "start" : "middle"}
              className="fill-c-limit font-semibold"
            >
              {limit.label}
            </text>
          </>
        )}
        {rows.map(({ id, title, note, value, text, kind }, i) => {
          const y = top + i * rowHeight + rowHeight / 2;
          const x = value === undefined ? undefined : toX(value);
          return (
            <g key={id}>
              <text x={0} y={y - 2} className="fill-ink">
                {title}
              </text>
              <text x={0} y={y + 14} className="fill-ink-3">
                {note}
              </text>
              {x === undefined ? (
                <text x={plot.left + 8} y={y + 4} className="fill-ink-3">
                  {text}
                </text>
              ) : (
                <>
                  {kind === "unfit" ? (
                    <path d={`M${x - 5} ${y - 5}l10 10M${x + 5} ${y - 5}l-10 10`} className="stroke-ink-3" strokeWidth="2" />
                  ) : (
                    <circle
                      cx={x}
                      cy={y}
                      r="5.5"
                      className={`stroke-c-wall ${kind === "used" ? "fill-c-wall" : "fill-sheet"}`}
                      strokeWidth="2.4"
                    />
                  )}
                  <text
                    x={x > plot.right - 70 ? x - 12 : x + 12}
                    y={y + 4}
                    textAnchor={x > plot.right - 70 ? "end" : "start"}
                    className="fill-ink stroke-sheet"
                    strokeWidth="3"
                    paintOrder="stroke"
                  >
                    {text}
                  </text>
                </>
              )}
            </g>
          );
        })}
        <text x={plot.right} y={bottom + 32} textAnchor="end" className="fill-ink-3">
          {unit}
        </text>
      </svg>
    </div>
  );
}

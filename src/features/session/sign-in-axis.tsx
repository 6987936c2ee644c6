import { formatNumber } from "@/components/quantity/format";
import { lastMinute, pressureAt, targetBarGauge, targetMinutes } from "./sign-in-curve";

const left = 90;
const right = 1440;
const floor = 750;
const toX = (minutes: number): number => left + (minutes / lastMinute) * (right - left);
const toY = (barGauge: number): number => floor - (barGauge / 84) * 640;

const ticks = [0, 10, 20, 30, 40, 50, 60, 70, 80];
const curve = `M${Array.from({ length: 151 }, (_, i) => {
  const minutes = (i / 150) * lastMinute;
  return `${toX(minutes).toFixed(1)} ${toY(pressureAt(minutes)).toFixed(1)}`;
}).join("L")}`;
const mark = { x: toX(targetMinutes), y: toY(targetBarGauge) };

/** The page behind the form: a real axis, and the mark where the curve meets it. Decoration, so silent for readers by ear. */
export function SignInAxis() {
  return (
    <svg
      viewBox="0 0 1440 900"
      preserveAspectRatio="xMinYMax slice"
      aria-hidden="true"
      fill="none"
      className="absolute inset-0 h-full w-full phone:static phone:h-[240px] phone:flex-none phone:[&_text]:hidden"
    >
      {ticks.map((bar) => (
        <g key={bar}>
          <path d={`M${left} ${toY(bar)}H${right}`} className="stroke-rule" />
          <path d={`M${left - 12} ${toY(bar)}h12`} className="stroke-ink" strokeWidth="1.5" />
          <text x={left - 20} y={toY(bar) + 5} textAnchor="end" fontSize="15" className="fill-ink-3">
            {bar}
          </text>
        </g>
      ))}
      <path d={`M${left} ${toY(84)}V${floor}`} className="stroke-ink" strokeWidth="1.5" />
      <path d={`M${mark.x} 590V${floor}`} className="stroke-ink" strokeWidth="1.5" strokeDasharray="6 4" />
      <path d={`M${left} ${mark.y}H${right}`} className="stroke-ink" strokeWidth="1.5" strokeDasharray="6 4" />
      <path d={curve} className="stroke-tide" strokeWidth="5" strokeLinecap="round" />
      <circle cx={mark.x} cy={mark.y} r="8" className="fill-sheet stroke-ink" strokeWidth="3" />
      <text x={mark.x - 10} y="600" textAnchor="end" fontSize="17" fontWeight="600" className="fill-ink">
        the mark: {formatNumber(targetBarGauge, { figures: 3 })} bar(g) after {formatNumber(targetMinutes, { decimals: 1 })} min
      </text>
      <text x={left + 2} y="92" fontSize="15" className="fill-ink-3">
        pressure, bar(g)
      </text>
      <text x="900" y="780" textAnchor="end" fontSize="15" className="fill-ink-3">
        time since the valve opened, min
      </text>
    </svg>
  );
}

"use client";

import type { OutletPlace } from "@/engine/cases/blowdown-case";
import { formatQuantity } from "../quantity/format";
import { useUnits } from "../units/units-provider";
import { barLength, layOut, type Layout, type VesselItem, type View } from "./vessel-layout";
import { cutAtLevel, type Point } from "./vessel-profile";
import { vesselSentence } from "./vessel-sentence";

const outletWords: Record<OutletPlace, string> = { vapour: "vapour out", liquid: "liquid out", whole: "mixture out" };
const metresPerFoot = 0.3048;

/**
 * Vessels drawn to one scale from their dimensions: steel solid where gas wets it, dashed and heavier where liquid does, the liquid up to its
 * level, the outlet where it leaves. The wall is a line; its thickness is not to scale.
 *
 * items    those without a shape (plain volumes) are left out
 * outlet   drawn at the first vessel
 */
export function VesselDrawing({ items, outlet }: { items: readonly VesselItem[]; outlet?: OutletPlace }) {
  const { system } = useUnits();
  const layout = layOut(items, outlet);
  if (!layout) return null;
  const length = (metres: number) => formatQuantity("length", metres, system === "SI" ? "m" : "ft").text;
  return (
    <div className="overflow-x-auto" tabIndex={0} role="group" aria-label="Vessel to scale">
      <svg
        role="img"
        aria-label={vesselSentence(items, outlet, length)}
        viewBox={`0 0 ${layout.width} ${layout.height}`}
        className="block h-auto w-full min-w-[640px] font-num text-[13px]"
      >
        {layout.views.map((view, i) => (
          <ViewOf key={i} view={view} layout={layout} length={length} outlet={i === 0 ? outlet : undefined} />
        ))}
        <ScaleBar layout={layout} system={system} />
      </svg>
    </div>
  );
}

type ViewProps = { view: View; layout: Layout; length: (metres: number) => string; outlet: OutletPlace | undefined };

function ViewOf({ view, layout: { pixelsPerM, floor, underFloor }, length, outlet }: ViewProps) {
  const { item, profile, kind, outline } = view;
  const at = ({ x, y }: Point): Point => ({ x: view.x + x * pixelsPerM, y: view.bottom - y * pixelsPerM });
  const widthPx = (kind === "end" ? (profile.endViewM ?? 0) : profile.widthM) * pixelsPerM;
  const heightPx = profile.heightM * pixelsPerM;
  const top = view.bottom - heightPx;
  const middle = view.x + widthPx / 2;
  const level = item.levelM;
  // A vessel drawn shorter than it is has its liquid at the same part of the height.
  const drawnLevel = level === undefined ? undefined : (level / profile.trueHeightM) * profile.heightM;
  const { below, above } = drawnLevel === undefined ? { below: [], above: outline } : cutAtLevel(outline, drawnLevel);
  const lying = profile.tangents !== undefined;
  const round = item.geometry.shape === "sphere";

  return (
    <g>
      {below.length > 0 && <path d={path(below.map(at), true)} className="fill-c-fluid" fillOpacity={0.14} />}
      {drawnLevel !== undefined && below.length > 0 && above.length > 0 && (
        <SurfaceOf below={below.map(at)} y={at({ x: 0, y: drawnLevel }).y} />
      )}
      <path
        d={path(above.map(at), drawnLevel === undefined)}
        fill="none"
        className="stroke-c-wall"
        strokeWidth={3.2}
        strokeLinejoin="round"
      />
      {below.length > 0 && (
        <path d={path(below.map(at), false)} fill="none" className="stroke-c-wall" strokeWidth={6} strokeDasharray="9 3" />
      )}
      {profile.broken && kind === "side" && (
        <Break at={middle} from={top} to={view.bottom} lying={lying} x={view.x} width={widthPx} />
      )}
      {kind === "side" && lying && profile.tangents && (
        <>
          {profile.tangents.map((x) => (
            <path
              key={x}
              d={`M${at({ x, y: 0 }).x} ${top - 8}V${floor + underFloor + 6}`}
              className="stroke-rule-3"
              strokeDasharray="1 3"
              fill="none"
            />
          ))}
          <Along
            from={at({ x: profile.tangents[0], y: 0 }).x}
            to={at({ x: profile.tangents[1], y: 0 }).x}
            y={floor + underFloor}
            words={lengthWords(item, length)}
          />
        </>
      )}
      {kind === "side" && (
        <text
          x={lying ? view.x : middle}
          y={lying || outlet === undefined || outlet === "liquid" ? top - 18 : top - 34}
          textAnchor={lying ? "start" : "middle"}
          className="fill-ink font-semibold"
        >
          {item.tag}
        </text>
      )}
      {kind === "end" && (
        <text x={middle} y={top - 18} textAnchor="middle" className="fill-ink-3">
          end view
        </text>
      )}
      {(kind === "end" || !lying) && (
        <Upright x={view.x + widthPx + 14} from={top} to={view.bottom} words={length(profile.trueHeightM)} />
      )}
      {!lying && !round && <Along from={view.x} to={view.x + widthPx} y={floor + underFloor} words={length(profile.widthM)} />}
      {outlet && (
        <Outlet place={outlet} x={lying ? view.x + 0.74 * widthPx : middle} top={top} bottom={view.bottom} beside={!lying} />
      )}
    </g>
  );
}

function lengthWords({ geometry }: VesselItem, length: (metres: number) => string): string {
  if (geometry.shape === "pipe") return length(geometry.lengthM);
  return geometry.shape === "cylinder" ? `${length(geometry.tangentLengthM)} between tangents` : "";
}

/** The liquid's surface, and three hairlines beneath it that get shorter with the shape. */
function SurfaceOf({ below, y }: { below: readonly Point[]; y: number }) {
  const [first, last] = [below[0], below.at(-1)];
  if (!first || !last) return null;
  const deepest = Math.max(...below.map((point) => point.y));
  const hairlines = [5, 10, 15].map((step) => y + step).filter((at) => at < deepest - 3);
  return (
    <>
      <path d={`M${first.x} ${y}H${last.x}`} className="stroke-c-fluid" strokeWidth={1.6} />
      {hairlines.map((at) => {
        const [from, to] = chordAt(below, at);
        return (
          <path key={at} d={`M${from + 4} ${at}H${to - 4}`} className="stroke-c-fluid" strokeOpacity={0.55} strokeWidth={1} />
        );
      })}
    </>
  );
}

/** Left and right wall at a height of the page. */
function chordAt(run: readonly Point[], y: number): [number, number] {
  const crossings = run.slice(1).flatMap((point, i) => {
    const before = run[i];
    if (!before || (before.y - y) * (point.y - y) > 0 || before.y === point.y) return [];
    return [before.x + ((y - before.y) / (point.y - before.y)) * (point.x - before.x)];
  });
  return [Math.min(...crossings), Math.max(...crossings)];
}

function Outlet({
  place,
  x,
  top,
  bottom,
  beside,
}: {
  place: OutletPlace;
  x: number;
  top: number;
  bottom: number;
  beside: boolean;
}) {
  const up = place !== "liquid";
  const edge = up ? top : bottom;
  const away = up ? -1 : 1;
  const words = beside && up ? { x: x + 46, y: edge - 8 } : { x: x + 14, y: edge + away * 14 + 4 };
  return (
    <g>
      <path
        d={`M${x - 5} ${edge + away * 2}v${away * 14}M${x + 5} ${edge + away * 2}v${away * 14}`}
        className="stroke-c-wall"
        strokeWidth={2}
        fill="none"
      />
      <path
        d={`M${x} ${edge - away * 8}V${edge + away * 26}M${x - 4} ${edge + away * 20}L${x} ${edge + away * 27}L${x + 4} ${edge + away * 20}`}
        className="stroke-ink"
        strokeWidth={1.4}
        fill="none"
      />
      <text x={words.x} y={words.y} className="fill-ink-2">
        {outletWords[place]}
      </text>
    </g>
  );
}

/** A gap with two jagged edges: the length goes on. */
function Break({
  at,
  from,
  to,
  lying,
  x,
  width,
}: {
  at: number;
  from: number;
  to: number;
  lying: boolean;
  x: number;
  width: number;
}) {
  if (lying) {
    const middle = (from + to) / 2;
    const edge = (dx: number) => `M${at + dx} ${from - 6}V${middle - 6}l-5 4l10 5l-5 4V${to + 6}`;
    return (
      <>
        <path d={`M${at - 4} ${from - 6}H${at + 4}V${to + 6}H${at - 4}Z`} className="fill-sheet" />
        <path d={`${edge(-4)}${edge(4)}`} className="stroke-c-wall" strokeWidth={1.2} fill="none" />
      </>
    );
  }
  const middle = (from + to) / 2;
  const centre = x + width / 2;
  const edge = (dy: number) => `M${x - 6} ${middle + dy}H${centre - 6}l4 -5l5 10l4 -5H${x + width + 6}`;
  return (
    <>
      <path d={`M${x - 6} ${middle - 4}H${x + width + 6}V${middle + 4}H${x - 6}Z`} className="fill-sheet" />
      <path d={`${edge(-4)}${edge(4)}`} className="stroke-c-wall" strokeWidth={1.2} fill="none" />
    </>
  );
}

function Along({ from, to, y, words }: { from: number; to: number; y: number; words: string }) {
  return (
    <g className="stroke-ink-3">
      <path d={`M${from} ${y}H${to}M${from} ${y - 4}v8M${to} ${y - 4}v8`} fill="none" />
      <text x={(from + to) / 2} y={y + 17} textAnchor="middle" stroke="none" className="fill-ink-3">
        {words}
      </text>
    </g>
  );
}

function Upright({ x, from, to, words }: { x: number; from: number; to: number; words: string }) {
  return (
    <g className="stroke-ink-3">
      <path d={`M${x} ${from}V${to}M${x - 4} ${from}h8M${x - 4} ${to}h8`} fill="none" />
      <text x={x + 8} y={(from + to) / 2 + 4} stroke="none" className="fill-ink-3">
        {words}
      </text>
    </g>
  );
}

function ScaleBar({ layout: { pixelsPerM, height, views }, system }: { layout: Layout; system: "SI" | "US" }) {
  const unitM = system === "SI" ? 1 : metresPerFoot;
  const value = barLength(120 / pixelsPerM / unitM);
  const length = value * unitM * pixelsPerM;
  const y = height - 10;
  const broken = views.some(({ profile }) => profile.broken);
  return (
    <g>
      <path
        d={`M12 ${y}h${length}M12 ${y - 4}v8M${12 + length / 2} ${y - 4}v8M${12 + length} ${y - 4}v8`}
        className="stroke-ink"
        strokeWidth={1.4}
        fill="none"
      />
      <text x={length + 22} y={y + 4} className="fill-ink-3">
        {`${Number(value.toPrecision(1))}\u00a0${system === "SI" ? "m" : "ft"}, one scale${broken ? "; long shells are broken" : ""}`}
      </text>
    </g>
  );
}

const path = (points: readonly Point[], close: boolean): string =>
  points.map(({ x, y }, i) => `${i === 0 ? "M" : "L"}${x.toFixed(2)} ${y.toFixed(2)}`).join("") + (close ? "Z" : "");

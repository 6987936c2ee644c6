/** A record's own pressure curve: `x` in 0..1 of twice the time allowed, `y` in 0..1 of the starting pressure; the post at the target. */
export type EbbShape = { x: readonly number[]; y: readonly number[]; postX: number | null; beyond: boolean };

/**
 * The ebb of a record in a list. Without a run there are empty axes, never a made-up curve. Hidden from screen readers: the row says
 * verdict and figures in words.
 */
export function EbbThumb({ ebb, width = 92, height = 26 }: { ebb: EbbShape | null; width?: number; height?: number }) {
  const floor = height - 1.5;
  const toX = (x: number) => (2 + clamp(x) * (width - 4)).toFixed(1);
  const toY = (y: number) => (3 + (1 - clamp(y)) * (floor - 4)).toFixed(1);

  return (
    <svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} aria-hidden="true" fill="none" className="max-w-full">
      <path d={`M2 ${floor}h${width - 4}`} className="stroke-rule-3" />
      {ebb ? (
        <path d={pathOf(ebb, toX, toY)} className="stroke-tide" strokeWidth="2" strokeLinejoin="round" />
      ) : (
        <>
          <path d={`M2 3V${floor}`} className="stroke-rule-3" />
          <path d={`M2 4h${width - 4}`} className="stroke-rule-2" strokeDasharray="2 4" />
        </>
      )}
      {ebb?.postX != null && (
        <path
          d={`M${toX(ebb.postX)} 4V${height - 1}`}
          className={ebb.beyond ? "stroke-beyond" : "stroke-ink"}
          strokeWidth="1.5"
          strokeDasharray="3 2"
        />
      )}
    </svg>
  );
}

const clamp = (value: number): number => Math.min(Math.max(value, 0), 1);

function pathOf({ x, y }: EbbShape, toX: (x: number) => string, toY: (y: number) => string): string {
  const points = x.flatMap((at, i) => {
    const level = y[i];
    return level !== undefined && Number.isFinite(at) && Number.isFinite(level) ? [`${toX(at)} ${toY(level)}`] : [];
  });
  return points.length > 1 ? `M${points.join("L")}` : "";
}

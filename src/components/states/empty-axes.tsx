/** Axes without a curve: nothing was run yet, or it is being drawn. A curve is never made up. */
export function EmptyAxes({ width = 280, height = 70 }: { width?: number; height?: number }) {
  return (
    <svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} aria-hidden="true" fill="none" className="max-w-full">
      <path d={`M2 ${height - 2}h${width - 4}M2 4v${height - 6}`} className="stroke-rule-3" />
      <path d={`M2 6h${width - 4}`} className="stroke-rule-2" strokeDasharray="2 4" />
    </svg>
  );
}

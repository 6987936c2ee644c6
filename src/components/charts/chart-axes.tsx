/** A chart on its way: axes alone, at the size the curves will have. */
export function ChartAxes() {
  return (
    <svg className="h-full w-full" preserveAspectRatio="none" viewBox="0 0 100 100" aria-hidden="true" fill="none">
      <path d="M12 10V86H98" className="stroke-rule-3" vectorEffect="non-scaling-stroke" />
    </svg>
  );
}

/** Amount on a logarithmic scale from 0.01 to 100 mol %, as SVG geometry. */
export function AmountBar({ molePercent }: { molePercent: number | null }) {
  if (!molePercent || molePercent <= 0) return null;
  const share = Math.min(1, Math.max(0.01, (Math.log10(molePercent) + 2) / 4));
  return (
    <svg viewBox="0 0 200 10" width="200" height="10" aria-hidden="true" className="max-w-full">
      <rect x="0" y="1" width={200 * share} height="8" className="fill-c-pressure" />
    </svg>
  );
}

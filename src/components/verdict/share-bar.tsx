import type { Verdict } from "./verdict";

const width = 150;
const left = 4;
const right = width - left;
/** The bar ends at 125 % of the limit; the post stands at 100 %. */
const fullScale = 1.25;

const fill: Record<Verdict, string> = { within: "fill-within", near: "fill-near", beyond: "fill-beyond", open: "fill-open" };

/**
 * How much of a limit is used, as a bar against a post. Hidden from readers of the page by ear: the figures beside it say the same.
 *
 * share   value over limit [-]; below 0 draws nothing, above 1.25 stops at the end
 */
export function ShareBar({ share, verdict }: { share: number; verdict: Verdict }) {
  const drawn = Math.min(Math.max(share, 0), fullScale);
  const toX = (value: number) => left + (value / fullScale) * (right - left);

  return (
    <svg width={width} height="20" viewBox={`0 0 ${width} 20`} aria-hidden="true" className="max-w-full">
      <path d={`M${left} 15.5H${right}`} className="stroke-rule-2" />
      <rect x={left} y="6" width={(toX(drawn) - left).toFixed(1)} height="7" className={fill[verdict]} />
      <path d={`M${toX(1).toFixed(1)} 1V19`} className="stroke-ink" strokeWidth="2" />
    </svg>
  );
}

const width = 132;
const [left, right] = [6, width - 6];
const [least, most] = [0.5, 1.05];

/** From ring to dot on the share of a limit that is used, 50 to 105 %, against a post at the limit. What it shows stands beside it in figures. */
export function ShareMove({ from, to }: { from: number | undefined; to: number | undefined }) {
  const toX = (share: number) => left + ((Math.min(Math.max(share, least), most) - least) / (most - least)) * (right - left);
  return (
    <svg width={width} height="20" viewBox={`0 0 ${width} 20`} aria-hidden="true" className="max-w-full">
      <path d={`M${left} 10H${right}`} className="stroke-rule-2" />
      <path d={`M${toX(1)} 3V17`} className="stroke-ink" strokeWidth="2" />
      {from !== undefined && to !== undefined && (
        <path d={`M${toX(from)} 10H${toX(to)}`} className="stroke-ink-2" strokeWidth="1.6" />
      )}
      {from !== undefined && <circle cx={toX(from)} cy="10" r="4" className="fill-sheet stroke-ink-2" strokeWidth="1.6" />}
      {to !== undefined && <circle cx={toX(to)} cy="10" r="4.4" className="fill-ink" />}
    </svg>
  );
}

/**
 * Steps of a bridge: each starts where the one before ended, and the last bar is their sum, from zero.
 *
 * value   in the unit shown, signed
 * note    small type under the name
 */
export type BridgeStep = { label: string; note?: string; value: number };

export type BridgeBar = BridgeStep & { from: number; to: number; kind: "rise" | "fall" | "sum" };

/** Where each bar lies. The sum is computed from the steps, so a drawing can't disagree with its own parts. */
export function bridgeBars(steps: readonly BridgeStep[], sum: { label: string; note?: string }): BridgeBar[] {
  let level = 0;
  const bars: BridgeBar[] = steps.map((step) => {
    const from = level;
    level += step.value;
    return { ...step, from, to: level, kind: step.value < 0 ? "fall" : "rise" };
  });
  return [...bars, { ...sum, value: level, from: 0, to: level, kind: "sum" }];
}

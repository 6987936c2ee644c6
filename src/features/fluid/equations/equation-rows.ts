/** Spread of a figure over the equations that are fit. Pure. */
import type { FitnessVerdict } from "@/engine/eos/fitness";
import { isAdmitted } from "./fitness-words";

export type Ends = { low: number; high: number };

/** Lowest and highest of the admitted equations; nothing with fewer than two, as one alone shows no spread. */
export function spreadOf<T extends { verdict: FitnessVerdict }>(
  entries: readonly T[],
  figure: (entry: T) => number | undefined,
): Ends | undefined {
  const values = entries.flatMap((entry) => {
    const value = isAdmitted(entry.verdict) ? figure(entry) : undefined;
    return value !== undefined && Number.isFinite(value) ? [value] : [];
  });
  return values.length < 2 ? undefined : { low: Math.min(...values), high: Math.max(...values) };
}

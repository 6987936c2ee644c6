/**
 * How firmly a segment stands on the number of phases it starts with.
 *
 * A segment pins its number of phases so that the right-hand side is smooth, and ends where that number stops being right. On the boundary
 * itself the number is a matter of round-off, and where the balances push the fluid back to the boundary from both sides it changes without
 * end. There a short segment runs unpinned: the equilibrium is found at every instant, whatever its phases, and the next one may pin again.
 */
import { EngineError } from "../../errors";
import type { Balance } from "./balance";
import type { PhaseMode } from "./contents";
import type { PhaseChange } from "./integrate-run";
import { isStableAlone } from "./phase-check";

/** Lengths as parts of the time in which the vessel would empty at its first rate. */
const firstFreePart = 2e-4;
const longestFreePart = 0.5;
const growth = 4;
/** This many changes within this part of the emptying time are a chatter. */
const chatters = [
  { changes: 4, within: 1e-3 },
  { changes: 8, within: 0.05 },
];

export class PhaseFooting {
  private freeS: number;

  constructor(
    private readonly balance: Balance,
    private readonly emptyingTimeS: number,
  ) {
    this.freeS = firstFreePart * emptyingTimeS;
  }

  /** How long [s] to run unpinned from (t, y), or undefined where `mode` may be pinned. */
  freeForS(t: number, y: number[], mode: PhaseMode, changes: readonly PhaseChange[]): number | undefined {
    const chattering = chatters.some(({ changes: count, within }) => {
      const first = changes.at(-count);
      return first !== undefined && t - first.timeS < within * this.emptyingTimeS;
    });
    if (!chattering && this.stands(t, y, mode)) return undefined;
    const length = this.freeS;
    this.freeS = Math.min(growth * length, longestFreePart * this.emptyingTimeS);
    return length;
  }

  private stands(t: number, y: number[], mode: PhaseMode): boolean {
    try {
      const { contents } = this.balance.at(t, y, mode);
      return mode === "one-phase" ? isStableAlone(this.balance.model.fluid, contents) : contents.phases === 2;
    } catch (error) {
      if (error instanceof EngineError && error.code === "no-convergence") return false;
      throw error;
    }
  }
}

/** What happened in a run, told from its series: phases that appear and go. Times in s. */
import type { BlowdownResult, BlowdownSeries, EndedBy } from "@/engine/cases/blowdown-result";

export type RunEvent = { timeS: number; row: number; words: string };

type Phases = "vapour" | "both" | "liquid";

const phasesAt = ({ vapourMoleFraction }: BlowdownSeries, row: number): Phases => {
  const part = vapourMoleFraction[row] ?? 1;
  return part >= 1 ? "vapour" : part <= 0 ? "liquid" : "both";
};

const changes: Record<Phases, Partial<Record<Phases, string>>> = {
  vapour: { both: "first liquid", liquid: "all liquid" },
  both: { vapour: "last liquid gone", liquid: "last vapour gone" },
  liquid: { both: "first vapour", vapour: "all vapour" },
};

/** Changes of phase in the order of time; a flicker that is undone within a thousandth of the run is left out. */
export function runEvents({ series, summary }: Pick<BlowdownResult, "series" | "summary">): RunEvent[] {
  const found: (RunEvent & { from: Phases; to: Phases })[] = [];
  for (let row = 1; row < series.timeS.length; row++) {
    const [from, to] = [phasesAt(series, row - 1), phasesAt(series, row)];
    const words = changes[from][to];
    if (words) found.push({ timeS: series.timeS[row] ?? 0, row, words, from, to });
  }
  const short = summary.endTimeS / 1000;
  const kept: typeof found = [];
  for (const event of found) {
    const last = kept.at(-1);
    if (last && event.timeS - last.timeS < short && event.to === last.from) kept.pop();
    else kept.push(event);
  }
  return kept.map(({ timeS, row, words }) => ({ timeS, row, words }));
}

/** Why the run ended, as a sentence. */
export const endingWords: Record<EndedBy, string> = {
  pressure: "It ended at the pressure of line 7.11.",
  time: "It ended at the time of line 7.10.",
  "solid-phase": "It ended where solid begins to form.",
  "back-pressure": "It ended at the back pressure.",
  "too-hot": "It ended where the fluid became too hot to go on.",
};

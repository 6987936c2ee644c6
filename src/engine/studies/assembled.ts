/** What every result of a study begins and ends with. */
import type { BlowdownCase } from "../cases/blowdown-case";
import type { FigureHead, Outcome } from "../cases/study-case";
import { oneTemperatureCaution, screeningCaution, studyCaution } from "../cautions";
import { figureHeads } from "./figures";

export type Done = Extract<Outcome, { figures: unknown }>;

export const isDone = (outcome: Outcome): outcome is Done => "figures" in outcome;

export function headOf(base: Done): {
  format: "ebbmark-result/1";
  kind: "study";
  figures: FigureHead[];
  base: Pick<Done, "figures" | "verdict">;
} {
  return {
    format: "ebbmark-result/1",
    kind: "study",
    figures: figureHeads.filter(({ id }) => base.figures[id] !== undefined),
    base: { figures: base.figures, verdict: base.verdict },
  };
}

export function tailOf(of: BlowdownCase, outcomes: readonly Outcome[]) {
  const cautions = [screeningCaution, oneTemperatureCaution(of.heat.wall.model), studyCaution];
  return {
    cautions: cautions.map(({ words }) => words),
    cautionIds: cautions.map(({ id }) => id as string),
    numerics: { runs: outcomes.length, evaluations: outcomes.reduce((sum, { evaluations }) => sum + evaluations, 0) },
  };
}

const words = { within: "Within", near: "Near", beyond: "Beyond", open: "Open" } as const;
export const verdictWord = (verdict: keyof typeof words): string => words[verdict];

/**
 * Percentiles of the governing figures over a Latin hypercube of the inputs.
 *
 * A figure that a sample does not reach (a time) counts as later than every other. Samples that the engine refused are listed, not counted.
 * Source   McKay, Beckman and Conover 1979; percentiles on straight lines between sorted values (rank (n − 1) P)
 * Checks   studies.test.ts
 */
import type { Verdict } from "../cases/blowdown-result";
import type { FigureHead, Outcome, PercentileResult, PercentileRow, PercentileStudy } from "../cases/study-case";
import type { Warning } from "../cases/warning";
import { headOf, isDone, tailOf, type Done } from "./assembled";
import { inputRules } from "./inputs";
import { planOf } from "./plan";

type Body = Omit<PercentileResult, "engineVersion" | "caseSha256" | "numerics"> & {
  numerics: Omit<PercentileResult["numerics"], "wallClockMs">;
};

export function assemblePercentiles(study: PercentileStudy, base: Done, outcomes: readonly Outcome[]): Body {
  const { inputs, variedAt } = planOf(study);
  const samples = outcomes.filter(({ index }) => index > 0).sort((a, b) => a.index - b.index);
  const done = samples.filter(isDone);
  const failed = samples.flatMap((outcome) =>
    isDone(outcome) ? [] : [{ index: outcome.index, ...outcome.refused, inputs: variedAt(outcome.index) }],
  );
  const head = headOf(base);
  const verdicts: Record<Verdict, number> = { within: 0, near: 0, beyond: 0, open: 0 };
  for (const { verdict } of done) verdicts[verdict]++;
  return {
    ...head,
    study: "percentiles",
    seed: study.seed,
    inputs: inputs.map((one) => {
      const { title, mode, unit } = inputRules[one.input];
      return { ...one, title, mode, unit };
    }),
    samples: { asked: study.samples, computed: done.length, failed },
    percentiles: head.figures.flatMap((figure) => rowOf(figure, done)),
    verdicts,
    rows: done.map(({ index, figures, verdict }) => ({ index, inputs: variedAt(index), figures, verdict })),
    sentence: sentenceOf(verdicts, done.length),
    warnings: warningsOf(study, samples.length, failed.length),
    ...tailOf(study.of, outcomes),
  };
}

function rowOf(head: FigureHead, done: readonly Done[]): PercentileRow[] {
  const reached = done.flatMap(({ figures }) => figures[head.id] ?? []).sort((a, b) => a - b);
  if (reached.length === 0) return [];
  const notReached = done.length - reached.length;
  const all = [...reached, ...new Array<number>(notReached).fill(Infinity)];
  const at = (part: number): number | undefined => {
    const value = percentile(all, part);
    return Number.isFinite(value) ? value : undefined;
  };
  const optional = <K extends string>(key: K, value: number | undefined) =>
    value === undefined ? {} : ({ [key]: value } as Record<K, number>);
  return [
    {
      ...head,
      ...optional("p10", at(0.1)),
      ...optional("p50", at(0.5)),
      ...optional("p90", at(0.9)),
      low: reached[0] ?? 0,
      high: reached.at(-1) ?? 0,
      mean: reached.reduce((sum, value) => sum + value, 0) / reached.length,
      notReached,
    },
  ];
}

/** Of sorted values. */
export function percentile(sorted: readonly number[], part: number): number {
  const rank = (sorted.length - 1) * part;
  const below = Math.floor(rank);
  const [a, b] = [sorted[below] ?? Number.NaN, sorted[Math.min(below + 1, sorted.length - 1)] ?? Number.NaN];
  return rank === below ? a : a + (b - a) * (rank - below);
}

function sentenceOf(verdicts: Record<Verdict, number>, computed: number): string {
  if (computed === 0) return "No sample could be computed.";
  if (verdicts.beyond === 0) return `None of ${computed} samples is beyond a limit.`;
  return `${verdicts.beyond} of ${computed} samples ${verdicts.beyond === 1 ? "is" : "are"} beyond a limit.`;
}

function warningsOf({ samples: asked }: PercentileStudy, ran: number, failed: number): Warning[] {
  return [
    ...(ran < asked
      ? [
          {
            code: "cut-short",
            message: `The study was stopped after ${ran} of ${asked} samples; the figures are those of ${ran}.`,
          },
        ]
      : []),
    ...(failed > 0
      ? [
          {
            code: "failed-samples",
            message: `${failed} of ${ran} samples could not be computed. They are listed with their inputs and are not in the percentiles.`,
          },
        ]
      : []),
  ];
}

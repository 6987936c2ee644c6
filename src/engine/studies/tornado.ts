/**
 * One input at a time, at the low and at the high end of its band, the others as the case has them. Bars are sorted by the width of one figure.
 *
 * Not a statement of probability. Checks   studies.test.ts (M10-01)
 */
import type { Figures, Outcome, TornadoBar, TornadoResult, TornadoStudy } from "../cases/study-case";
import { headOf, isDone, tailOf, type Done } from "./assembled";
import { figureHeads, leadingFigure } from "./figures";
import { inputIds, inputRules } from "./inputs";
import { planOf } from "./plan";

type Body = Omit<TornadoResult, "engineVersion" | "caseSha256" | "numerics"> & {
  numerics: Omit<TornadoResult["numerics"], "wallClockMs">;
};

export function assembleTornado(study: TornadoStudy, base: Done, outcomes: readonly Outcome[]): Body {
  const { inputs } = planOf(study);
  const sortedBy = leadingFigure(base.figures);
  const bars = inputs.flatMap(({ input, low, high }, i): TornadoBar[] => {
    const at = (index: number): Outcome | undefined => outcomes.find((outcome) => outcome.index === index);
    const [atLow, atHigh] = [at(1 + i), at(1 + inputs.length + i)];
    if (!atLow || !atHigh) return [];
    const { title, mode, unit } = inputRules[input];
    const refused = {
      ...("refused" in atLow ? { atLow: atLow.refused.message } : {}),
      ...("refused" in atHigh ? { atHigh: atHigh.refused.message } : {}),
    };
    return [
      {
        input,
        title,
        mode,
        unit,
        low,
        high,
        ...(isDone(atLow) ? { atLow: atLow.figures } : {}),
        ...(isDone(atHigh) ? { atHigh: atHigh.figures } : {}),
        ...(Object.keys(refused).length > 0 ? { refused } : {}),
        width: widthsOf(atLow, atHigh),
      },
    ];
  });
  const sorted = [...bars].sort((a, b) => (b.width[sortedBy] ?? -1) - (a.width[sortedBy] ?? -1));
  const [widest] = sorted;
  return {
    ...headOf(base),
    study: "tornado",
    bars: sorted,
    sortedBy,
    notVaried: inputIds.filter((input) => !inputs.some((one) => one.input === input)),
    sentence: widest
      ? `${widest.title} moves the ${(figureHeads.find(({ id }) => id === sortedBy)?.title ?? "").toLowerCase()} most.`
      : "Nothing was varied.",
    warnings: [],
    ...tailOf(study.of, outcomes),
  };
}

function widthsOf(low: Outcome, high: Outcome): Figures {
  const widths: Figures = {};
  if (!isDone(low) || !isDone(high)) return widths;
  for (const { id } of figureHeads) {
    const [a, b] = [low.figures[id], high.figures[id]];
    if (a !== undefined && b !== undefined) widths[id] = Math.abs(b - a);
  }
  return widths;
}

/**
 * One case under several equations of state: how far the governing figures differ among those that are fit for the fluid.
 *
 * An equation that is for comparison only, outside its range or refused is shown with its reason and left out of the ranges. The equation in use
 * always counts.
 * Source   spread = highest − lowest over the admitted equations; noted above 5 K in the lowest temperature or 5 % in the peak load
 */
import { fitness, type Fitness, type FitnessVerdict } from "../eos/fitness";
import type { FigureHead, FigureRange, Outcome, SpreadEntry, SpreadResult, SpreadStudy } from "../cases/study-case";
import type { Warning } from "../cases/warning";
import { EngineError } from "../errors";
import { headOf, isDone, tailOf, verdictWord, type Done } from "./assembled";
import { planOf } from "./plan";

type Body = Omit<SpreadResult, "engineVersion" | "caseSha256" | "numerics"> & {
  numerics: Omit<SpreadResult["numerics"], "wallClockMs">;
};

const admitted: readonly FitnessVerdict[] = ["first", "fit", "uncertain"];
const worstFirst: readonly FitnessVerdict[] = ["not-applicable", "outside-range", "comparison-only", "uncertain", "fit", "first"];

export function assembleSpread(study: SpreadStudy, base: Done, outcomes: readonly Outcome[]): Body {
  const judged = judge(study, base);
  const entries = planOf(study).equations.flatMap((equation, i): SpreadEntry[] => {
    const outcome = outcomes.find(({ index }) => index === i + 1);
    const fit = judged.get(equation);
    if (!outcome || !fit) return [];
    const used = equation === study.of.fluid.equation;
    const common = { equation, title: fit.title, fitness: fit.verdict, notes: fit.notes, used };
    if (!isDone(outcome)) return [{ ...common, inSpread: false, refused: outcome.refused.message }];
    const { figures, verdict, curve } = outcome;
    return [{ ...common, inSpread: used || admitted.includes(fit.verdict), figures, verdict, ...(curve ? { curve } : {}) }];
  });
  const counted = entries.filter((entry) => entry.inSpread);
  const head = headOf(base);
  const ranges = head.figures.flatMap((figure) => rangeOf(figure, base, counted));
  const others = counted.filter(({ verdict }) => verdict !== base.verdict);
  return {
    ...head,
    study: "spread",
    entries,
    ranges,
    verdictsDiffer: others.length > 0,
    sentence:
      others.length > 0
        ? `The verdict turns on the equation: ${verdictWord(base.verdict)}, ${others.map(({ verdict, title }) => `${verdictWord(verdict ?? "open")} by ${title}`).join(", ")}.`
        : counted.length > 1
          ? `The verdict does not turn on the equation: ${counted.length} equations that are fit for this fluid give ${verdictWord(base.verdict)}.`
          : "Only the equation in use is fit for this fluid and was computed: nothing is said of its spread.",
    warnings: wide(ranges),
    ...tailOf(study.of, outcomes),
  };
}

type Judged = Pick<Fitness, "title" | "verdict" | "notes">;

/** Fitness at the start and at the end of the run, the worse of the two. */
function judge({ of }: SpreadStudy, { figures, curve }: Done): Map<string, Judged> {
  const last = (curve?.timeS.length ?? 0) - 1;
  const points = [0, last].flatMap((i) => {
    const [temperatureK, pressurePa] = [curve?.fluidTemperatureK[i], curve?.pressurePa[i]];
    return temperatureK !== undefined && pressurePa !== undefined ? [{ temperatureK, pressurePa }] : [];
  });
  const fallback = { temperatureK: figures.minimumFluidTemperatureK ?? 300, pressurePa: 1e5 };
  const worst = new Map<string, Judged>();
  for (const point of points.length > 0 ? points : [fallback]) {
    for (const { equation, title, verdict, notes } of fitness(of.fluid, point)) {
      const before = worst.get(equation);
      const worse = !before || worstFirst.indexOf(verdict) < worstFirst.indexOf(before.verdict);
      const all = [...(before?.notes ?? []), ...notes];
      worst.set(equation, { title, verdict: worse ? verdict : before.verdict, notes: [...new Set(all)] });
    }
  }
  if (worst.size === 0) throw new EngineError("no-convergence", "No equation could be judged.");
  return worst;
}

function rangeOf(head: FigureHead, base: Done, counted: readonly SpreadEntry[]): FigureRange[] {
  const values = counted.flatMap(({ figures }) => figures?.[head.id] ?? []);
  if (values.length === 0) return [];
  const used = base.figures[head.id];
  const [low, high] = [Math.min(...values, used ?? Infinity), Math.max(...values, used ?? -Infinity)];
  const inHand = base.inHand[head.id];
  return [
    {
      ...head,
      ...(used === undefined ? {} : { used }),
      low,
      high,
      spread: high - low,
      ...(inHand === undefined ? {} : { inHand, ...(inHand > 0 ? { share: (high - low) / inHand } : {}) }),
    },
  ];
}

const wideK = 5;
const wideShare = 0.05;

function wide(ranges: readonly FigureRange[]): Warning[] {
  const temperature = ranges.find(({ id, spread }) => id === "minimumFluidTemperatureK" && spread > wideK);
  const load = ranges.find(({ id, spread, low }) => id === "peakVentRateKgPerS" && spread > wideShare * low);
  const parts = [
    ...(temperature ? [`${temperature.spread.toPrecision(2)} K in the lowest fluid temperature`] : []),
    ...(load ? [`${((100 * load.spread) / load.low).toPrecision(2)} % in the peak load`] : []),
  ];
  return parts.length === 0
    ? []
    : [
        {
          code: "equation-spread",
          message: `The result depends on the equation of state: ${parts.join(" and ")} between those that are fit.`,
        },
      ];
}

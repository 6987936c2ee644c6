/**
 * Holds the figures of a run against the limits.
 *
 *   Within  inside the limit and outside the near band      Near    inside the limit and in the band
 *   Beyond  past the limit or equal to it                   Open    no limit, or not computed
 *
 * The near band is 10 K or 10 % of the limit, which a policy may only widen. The overall verdict is the worst of the lines, Open aside;
 * a required line that is Open makes it Open unless something is Beyond. The line with the least in hand, relative to its band, governs.
 */
import type { AssessedLimit, LimitId, Verdict } from "../cases/blowdown-result";

export type Figure = {
  id: LimitId;
  title: string;
  unit: AssessedLimit["unit"];
  sense: AssessedLimit["sense"];
  value?: number;
  limit?: number;
  note?: string;
  difference?: true;
  required: boolean;
};

export type NearBand = { bandK: number; bandFraction: number };

export const defaultNearBand: NearBand = { bandK: 10, bandFraction: 0.1 };

export function assess(figures: Figure[], given: Partial<NearBand>): { limits: AssessedLimit[]; verdict: Verdict } {
  const band: NearBand = {
    bandK: Math.max(given.bandK ?? 0, defaultNearBand.bandK),
    bandFraction: Math.max(given.bandFraction ?? 0, defaultNearBand.bandFraction),
  };
  const judged = figures.map((figure) => judge(figure, band));
  const closest = judged.reduce<number>(
    (least, { relative }) => Math.min(least, relative ?? Number.POSITIVE_INFINITY),
    Number.POSITIVE_INFINITY,
  );
  const governing = judged.findIndex(({ relative }) => relative === closest);
  const limits = judged.map(({ limit }, i) => ({ ...limit, governs: i === governing }));
  return { limits, verdict: overall(figures, limits) };
}

function judge(figure: Figure, { bandK, bandFraction }: NearBand): { limit: AssessedLimit; relative: number | undefined } {
  const { required: _required, ...shown } = figure;
  const { value, limit, sense, unit } = figure;
  // A target that was not reached in time is beyond its limit although it has no value.
  if (value === undefined || limit === undefined)
    return { limit: { ...shown, verdict: "open", governs: false }, relative: undefined };
  const inHand = sense === "at-most" ? limit - value : value - limit;
  const near = unit === "K" ? bandK : bandFraction * Math.abs(limit);
  const verdict: Verdict = inHand <= 0 ? "beyond" : inHand < near ? "near" : "within";
  const used = sense === "at-most" ? value / limit : limit / value;
  const share = unit === "K" || !Number.isFinite(used) ? {} : { share: used };
  return { limit: { ...shown, inHand, ...share, verdict, governs: false }, relative: inHand / near };
}

function overall(figures: Figure[], limits: AssessedLimit[]): Verdict {
  const verdicts = limits.map((limit) => limit.verdict);
  if (verdicts.includes("beyond")) return "beyond";
  if (figures.some((figure, i) => figure.required && verdicts[i] === "open")) return "open";
  if (verdicts.includes("near")) return "near";
  return verdicts.includes("within") ? "within" : "open";
}

/** What belongs to a run besides its curves: where it started from, what follows it, its steel in a fire, and the further limits. */
import { restartCaution, ruptureCaution, settleOutCaution, type Caution } from "../cautions";
import type { BlowdownCase } from "../cases/blowdown-case";
import type { BlowdownResult, Warning } from "../cases/blowdown-result";
import { EngineError } from "../errors";
import { lateOpenings } from "../fire-steel/late-opening";
import { steelInFire } from "../fire-steel/steel-in-fire";
import type { Figure } from "../limits/assess";
import { furtherFigures, type LookedAt } from "../limits/further-figures";
import { settleOutReport } from "../start/settle-out-report";
import { afterwards, type EndOfRun } from "./afterwards";

export type AroundRun = {
  parts: Pick<BlowdownResult, "settleOut" | "afterwards" | "steelInFire">;
  figures: Figure[];
  warnings: Warning[];
  cautions: Caution[];
};

/** Without an end of the run, nothing is said of what follows it. */
export function aroundRun(blowdown: BlowdownCase, looked: LookedAt, end: EndOfRun | undefined): AroundRun {
  const { model, series, summary } = looked;
  const missed: Warning[] = [];
  const settleOut = model.settled && settleOutReport(model.fluid, model.settled, blowdown.start);
  const after = end && orNothing("What follows the blowdown", missed, () => afterwards(blowdown, end));
  const fire = orNothing("Steel in the fire", missed, () => {
    const found = steelInFire(blowdown, { fluid: model.fluid, series, summary });
    const late = found && blowdown.steelInFire?.lateByS ? lateOpenings(blowdown, model.fluid, looked.rerun) : undefined;
    return found && late ? { ...found, late } : found;
  });
  const further = orNothing("Distance to solid and hydrate, and liquid carried over,", missed, () =>
    furtherFigures(blowdown, looked),
  );
  const ratio = fire?.items.find((item) => item.governs);
  return {
    parts: {
      ...(settleOut ? { settleOut } : {}),
      ...(after ? { afterwards: after } : {}),
      ...(fire ? { steelInFire: fire } : {}),
    },
    figures: [...(further?.figures ?? []), ...(ratio ? [strengthFigure(ratio)] : [])],
    warnings: [...(further?.warnings ?? []), ...missed, ...thinWall(blowdown)],
    cautions: [...(settleOut ? [settleOutCaution] : []), ...(after ? [restartCaution] : []), ...(fire ? [ruptureCaution] : [])],
  };
}

const strengthFigure = (item: NonNullable<BlowdownResult["steelInFire"]>["items"][number]): Figure => ({
  id: "least-strength-ratio",
  title: "Least hot strength over stress",
  unit: "1",
  sense: "at-least",
  required: false,
  value: item.leastRatio,
  limit: 1,
  note: `${item.name}, at ${item.leastRatioTimeS.toPrecision(3)} s${
    item.ruptureTimeAtMoreFluxS === undefined
      ? ""
      : `; with 30 % more flux it ruptures at ${item.ruptureTimeAtMoreFluxS.toPrecision(3)} s`
  }.`,
});

/** What stands beside a run must not take the run away: it is left out, and a warning says so. */
function orNothing<Part>(what: string, missed: Warning[], work: () => Part): Part | undefined {
  try {
    return work();
  } catch (error) {
    if (!(error instanceof EngineError) || error.code === "cancelled" || error.code === "invalid-case") throw error;
    missed.push({ code: "not-computed-beside", message: `${what} could not be computed: ${error.message}` });
    return undefined;
  }
}

const ruleThicknessM = 0.025;
const ruleTimeS = 900;

/** The published fifteen minutes belong to walls of about 25 mm and more. */
function thinWall({ vessel, vessels, heat, limits }: BlowdownCase): Warning[] {
  const inFire = heat.outside.model === "pool-fire" || heat.outside.model === "surface-fire";
  const walls = [vessel.wall, ...(vessels ?? []).map((part) => part.wall)].flatMap((wall) => wall?.thicknessM ?? []);
  if (!inFire || walls.length === 0 || (limits?.targetTimeS ?? 0) < ruleTimeS) return [];
  const thinnest = Math.min(...walls);
  if (thinnest >= ruleThicknessM) return [];
  return [
    {
      code: "rule-wall-thickness",
      message: `The usual 15 min to half the design pressure hold for walls of about 25 mm or more; the thinnest here is ${(1000 * thinnest).toPrecision(3)} mm. Judge it by the steel in fire, not by the time.`,
    },
  ];
}

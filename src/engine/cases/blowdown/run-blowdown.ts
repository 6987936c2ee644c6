/** A blowdown from case to result: state, balances, integration, series, extremes, account, limits, cautions. */
import { threeSteps } from "../../account/three-steps";
import type { EndOfRun } from "../../after/afterwards";
import { aroundRun } from "../../after/around-run";
import { EngineError } from "../../errors";
import { assess } from "../../limits/assess";
import { blowdownFigures } from "../../limits/blowdown-figures";
import { expandPlusFractions } from "../../substances/plus-fraction";
import type { BlowdownCase } from "../blowdown-case";
import type { BlowdownResult, BlowdownSummary, EnergyAccount } from "../blowdown-result";
import type { Balance, Instant } from "./balance";
import { cautionsOfRun } from "./cautions-of-run";
import { highest, lowest, type Extreme } from "./extremes";
import { integrateRun, type Run } from "./integrate-run";
import { rebuiltState, type RebuiltState } from "./molar-state";
import { fitRun, indexOf, pieceAt, recount, type Counted, type Quantity } from "./run-fit";
import { makeBalance } from "./make-balance";
import { sizeBore } from "./size-bore";
import { sampleRows, seriesOf, type Row } from "./series";
import { solidMargin } from "./solid-check";
import { makeVesselModel } from "./vessel-model";
import { closureLimit, closureOf, warningsOf } from "./warnings";

export type BlowdownOptions = {
  onProgress?: (part: number) => void;
  isCancelled?: () => boolean;
  /** For a preview: a loose tolerance and wider gaps in the series. */
  coarse?: boolean;
  /** For one of many runs of a study: leaves out what follows the blowdown. */
  figuresOnly?: boolean;
  relativeTolerance?: number;
  maxEvaluations?: number;
};

export type BlowdownBody = Omit<BlowdownResult, "engineVersion" | "caseSha256" | "numerics"> & {
  numerics: Omit<BlowdownResult["numerics"], "wallClockMs">;
};

// At 1e-4 the dense output of a stiff film shows dips of kelvins that are not there; one more figure costs a third more work.
const previewTolerance = 1e-5;
const previewGaps = 3;
/** What the fit of a preview may leave unresolved, in parts of what a stored run may. */
const previewLooseness = 30;

export function runBlowdown(asked: BlowdownCase, options: BlowdownOptions = {}): BlowdownBody {
  const given: BlowdownCase = { ...asked, fluid: expandPlusFractions(asked.fluid) };
  const maxEvaluations = options.maxEvaluations ?? 200_000;
  const sized =
    given.release.path === "sized"
      ? sizeBore(given, given.release, { maxEvaluations, isCancelled: options.isCancelled })
      : undefined;
  const blowdown = sized?.document ?? given;
  const model = makeVesselModel(blowdown);
  const balance = makeBalance(model);
  refuseSolidStart(balance);

  const relativeTolerance =
    options.relativeTolerance ??
    (options.coarse ? Math.max(previewTolerance, blowdown.run.relativeTolerance) : blowdown.run.relativeTolerance);
  const run = integrateRun(balance, blowdown, {
    relativeTolerance,
    maxEvaluations,
    keepSamples: true,
    onProgress: options.onProgress,
    isCancelled: options.isCancelled,
  });
  const pieces = fitRun(balance, run, options.coarse ? previewLooseness : 1, options.isCancelled);
  const rows = sampleRows(balance, pieces, options.coarse ? previewGaps : 1);
  const found = extremesOf(balance, rows);
  const ends = endStates(balance, run, found.fluid);
  const counted = recount(pieces);
  const summary = {
    ...summarise(balance, run, rows, found, ends, counted),
    ...(sized ? { sizedDiameterM: sized.diameterM } : {}),
  };
  const series = seriesOf(balance, rows);
  const around = aroundRun(
    blowdown,
    {
      model,
      series,
      summary,
      contentsAt: (t) => instantAt(balance, run, t, "last").instant.contents,
      rerun: (other) =>
        runBlowdown(other, { coarse: true, ...(options.isCancelled ? { isCancelled: options.isCancelled } : {}) }),
    },
    options.figuresOnly ? undefined : endOfRun(balance, ends, rows),
  );
  const warnings = [...warningsOf(blowdown, model, run, rows, summary), ...around.warnings];
  const assessed = assess([...blowdownFigures(blowdown, summary, series), ...around.figures], {
    bandK: blowdown.limits?.nearBandK,
    bandFraction: blowdown.limits?.nearBandFraction,
  });
  const closes = closureOf(summary) <= closureLimit;
  const cautions = [...cautionsOfRun(blowdown, run, warnings), ...around.cautions];
  return {
    format: "ebbmark-result/1",
    kind: "blowdown",
    summary,
    series,
    energyAccount: accountOf(balance, ends, found.fluid.timeS, run.endTimeS),
    ...around.parts,
    verdict: closes ? assessed.verdict : "open",
    limits: closes
      ? assessed.limits
      : assessed.limits.map((limit) => ({ ...limit, verdict: "open" as const, governs: false, note: "The run does not close." })),
    warnings,
    cautions: cautions.map((caution) => caution.words),
    cautionIds: cautions.map((caution) => caution.id),
    numerics: { relativeTolerance, steps: run.steps, evaluations: run.evaluations },
  };
}

function refuseSolidStart(balance: Balance): void {
  const { start, solids, fluid } = balance.model;
  const { contents } = balance.at(0, balance.startState(), start.twoPhase ? "two-phase" : "one-phase");
  if (solids.length > 0 && solidMargin(fluid, contents, solids) <= 0) {
    throw new EngineError(
      "solid-phase",
      `At ${start.temperatureK} K and ${Math.round(start.pressurePa)} Pa part of the fluid is already solid, which is outside this program. Start warmer.`,
      {},
      "start",
    );
  }
}

type Extremes = { fluid: Extreme; wall: Extreme | undefined; outlet: Extreme; ventRate: Extreme };

function extremesOf(balance: Balance, rows: Row[]): Extremes {
  const of = (quantity: Quantity) => ({
    pick: (row: Row) => pieceAt(row.piece, indexOf[quantity], row.timeS),
    at: (row: Row, t: number) => pieceAt(row.piece, indexOf[quantity], t),
  });
  return {
    fluid: lowest(rows, of("temperatureK")),
    wall: balance.model.wall
      ? colder(lowest(rows, of("wallTemperatureK")), lowest(rows, of("liquidWallTemperatureK")))
      : undefined,
    outlet: lowest(rows, of("outletTemperatureK")),
    ventRate: highest(rows, of("ventRateKgPerS")),
  };
}

const colder = (a: Extreme, b: Extreme): Extreme => (b.value < a.value ? b : a);

/** First, coldest and last state, each rebuilt from its temperature and pressure. */
type Ends = { first: RebuiltState; coldest: RebuiltState; last: RebuiltState; lastY: number[] };

function endStates(balance: Balance, run: Run, coldest: Extreme): Ends {
  const stateAt = (t: number, side: "first" | "last"): { state: RebuiltState; y: number[] } => {
    const { y, instant } = instantAt(balance, run, t, side);
    return { state: rebuiltState(balance.model.fluid, instant.contents), y };
  };
  const last = stateAt(run.endTimeS, "last");
  return { first: stateAt(0, "first").state, coldest: stateAt(coldest.timeS, "last").state, last: last.state, lastY: last.y };
}

/** Everything at a time of the run; where a segment ends there, as it was before or after. */
function instantAt(balance: Balance, run: Run, t: number, side: "first" | "last"): { y: number[]; instant: Instant } {
  const all = run.segments.flatMap((segment) => segment.dense.steps.map((step) => ({ segment, step })));
  const inside = all.filter(({ step }) => t >= step.t0 && t <= step.t1);
  const place = (side === "first" ? inside[0] : inside.at(-1)) ?? all.at(side === "first" ? 0 : -1);
  if (!place) throw new EngineError("no-convergence", "The run ended before its first step.");
  return balance.within(place.segment, place.step, t);
}

function endOfRun(balance: Balance, { last, lastY }: Ends, rows: Row[]): EndOfRun {
  const { fluid, vessel, wall, start } = balance.model;
  const totalMolesMol = vessel.volumeM3 / last.molarVolumeM3PerMol;
  return {
    fluid,
    volumeM3: vessel.volumeM3,
    areaM2: vessel.innerAreaM2,
    composition: last.composition,
    totalMolesMol,
    internalEnergyJ: totalMolesMol * last.internalEnergyJPerMol,
    temperatureK: last.temperatureK,
    startTemperatureK: start.temperatureK,
    wall,
    wallMeanK: wall?.temperatureAtK(balance.wallEnergyJ(lastY)),
    coldestSteelK: rows.at(-1)?.wallTemperatureK,
  };
}

function summarise(balance: Balance, run: Run, rows: Row[], found: Extremes, ends: Ends, counted: Counted): BlowdownSummary {
  const first = rows[0];
  const last = rows.at(-1);
  if (!first || !last) throw new EngineError("no-convergence", "The run ended before its first step.");
  const carried: Counted = {
    massKg: balance.ventedMassKg(ends.lastY),
    energyJ: balance.ventedEnergyJ(ends.lastY),
    fromWallJ: balance.heatFromWallJ(ends.lastY),
    fromOutsideJ: balance.heatFromOutsideJ(ends.lastY),
  };
  const { energy, mass } = closures(balance, ends, carried);
  const again = closures(balance, ends, counted);
  const time = (id: string): number | undefined => run.marks.get(id);
  const optional = <K extends string>(key: K, value: number | undefined) =>
    value === undefined ? {} : ({ [key]: value } as Record<K, number>);
  return {
    initialMassKg: first.massKg,
    finalMassKg: last.massKg,
    ventedMassKg: last.ventedMassKg,
    initialPressurePa: first.pressurePa,
    initialTemperatureK: first.temperatureK,
    finalTemperatureK: last.temperatureK,
    finalPressurePa: last.pressurePa,
    endTimeS: run.endTimeS,
    endedBy: run.endedBy,
    peakVentRateKgPerS: found.ventRate.value,
    peakVentRateTimeS: found.ventRate.timeS,
    minimumFluidTemperatureK: found.fluid.value,
    minimumFluidTemperatureTimeS: found.fluid.timeS,
    ...optional("minimumWallTemperatureK", found.wall?.value),
    ...optional("minimumWallTemperatureTimeS", found.wall?.timeS),
    minimumOutletTemperatureK: found.outlet.value,
    minimumOutletTemperatureTimeS: found.outlet.timeS,
    ...optional("timeToHalfGaugePressureS", time("half-gauge")),
    ...optional("timeToSixPointNineBarGaugeS", time("6.9-bar-gauge")),
    ...optional("timeToTargetPressureS", time("target")),
    energyVentedJ: last.ventedEnergyJ,
    heatFromWallJ: balance.heatFromWallJ(ends.lastY),
    heatFromOutsideJ: balance.heatFromOutsideJ(ends.lastY),
    massClosure: mass,
    energyClosure: energy,
    massClosureRecounted: again.mass,
    energyClosureRecounted: again.energy,
  };
}

/**
 * Mass:   |V/v0 M0 − V/v1 M1 − vented| over the start mass.
 * Energy: |ΔU + ΔU_wall + vented − external heat| over the sum of their magnitudes.
 *
 * Mass, U and the wall's energy from the rebuilt states and the wall's temperature. What left and what heat passed is taken twice: as the
 * integrator carried it (which tests the states), and by quadrature of the rates that the states give (which tests the integration).
 */
function closures(balance: Balance, { first, last, lastY }: Ends, passed: Counted): { energy: number; mass: number } {
  const { fluid, vessel, wall } = balance.model;
  const amount = (state: RebuiltState): number => vessel.volumeM3 / state.molarVolumeM3PerMol;
  const massOf = (state: RebuiltState): number => amount(state) * fluid.mixtureMolarMass(state.composition);
  const change = amount(last) * last.internalEnergyJPerMol - amount(first) * first.internalEnergyJPerMol;
  const wallChange = wall ? wall.energyAtJ(wall.temperatureAtK(balance.wallEnergyJ(lastY))) : 0;
  const sum = Math.abs(change) + Math.abs(wallChange) + Math.abs(passed.energyJ) + Math.abs(passed.fromOutsideJ);
  return {
    mass: Math.abs(massOf(first) - massOf(last) - passed.massKg) / massOf(first),
    energy: Math.abs(change + wallChange + passed.energyJ - passed.fromOutsideJ) / sum,
  };
}

function accountOf(
  balance: Balance,
  { first, coldest, last, lastY }: Ends,
  coldestTimeS: number,
  endTimeS: number,
): EnergyAccount {
  const { fluid, vessel, wall } = balance.model;
  const total = (state: RebuiltState): number => (vessel.volumeM3 / state.molarVolumeM3PerMol) * state.internalEnergyJPerMol;
  const [startJ, endJ] = [total(first), total(last)];
  const heatFromWallJ = balance.heatFromWallJ(lastY);
  const outsideJ = balance.heatFromOutsideJ(lastY);
  // With a wall the outside heats the wall; what of it reached the fluid is in the heat from the wall.
  const heatFromOutsideJ = wall ? 0 : outsideJ;
  const ventedJ = balance.ventedEnergyJ(lastY);
  return {
    startToColdest: { ...threeSteps(fluid, first, coldest), atTimeS: coldestTimeS },
    startToEnd: { ...threeSteps(fluid, first, last), atTimeS: endTimeS },
    wholeRun: {
      startJ,
      heatFromWallJ,
      heatFromOutsideJ,
      ventedJ,
      endJ,
      leftOverJ: startJ + heatFromWallJ + heatFromOutsideJ - ventedJ - endJ,
    },
  };
}

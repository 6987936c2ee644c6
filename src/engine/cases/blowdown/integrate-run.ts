/**
 * The run itself: segments of one phase mode each, joined at the events that end them.
 *
 * Events: the pressure to stop at; the phase that appears or disappears; solid; and, only noted, the pressures that people ask about.
 * A change of the valve's opening law is a known time and starts a segment of its own.
 */
import { EngineError } from "../../errors";
import { integrate, type IntegrationEvent } from "../../ode/integrate";
import type { BlowdownCase } from "../blowdown-case";
import type { EndedBy } from "../blowdown-result";
import type { Balance } from "./balance";
import type { PhaseMode } from "./contents";
import { coarse, coarseCount } from "./chebyshev";
import { DenseRun } from "./dense-run";
import { isStableAlone } from "./phase-check";
import { PhaseFooting } from "./phase-footing";
import { nextChangeS, openPaths } from "./release-path";
import { quantitiesOf } from "./run-fit";
import { zonesBegin, zonesEnd, ZonedBalance } from "./zones/zoned-balance";
import { solidMargin, type SolidCurve } from "./solid-check";

export type Segment = { mode: PhaseMode; open: readonly boolean[]; dense: DenseRun };
export type PhaseChange = { timeS: number; to: PhaseMode; temperatureK: number; pressurePa: number };
export type Run = {
  segments: Segment[];
  endTimeS: number;
  endedBy: EndedBy;
  marks: Map<string, number>;
  phaseChanges: PhaseChange[];
  steps: number;
  evaluations: number;
};

export type RunOptions = {
  relativeTolerance: number;
  maxEvaluations: number;
  onProgress?: (part: number) => void;
  isCancelled?: () => boolean;
  /** Keep what is evaluated along the way for the series; needless where only times are asked for. */
  keepSamples?: boolean;
};

const maxSegments = 60;
const maxSegmentsWithRelief = 400;
const places = Array.from(coarse.places.subarray(1));
/** A fresh start at the sonic limit spares steps; where the throat's place is noise, more of them would only chatter. */
const subsonicRestarts = 2;
/** The flow stops where the pressure meets the back pressure; so near it, nothing is left to leave. */
const backPressureReached = 1e-5;

/** Heat capacities are fitted to about this; a vessel has failed long before. */
const hottestK = 1000;

export function integrateRun(balance: Balance, blowdown: BlowdownCase, options: RunOptions): Run {
  const { model } = balance;
  const { start, backPressurePa, paths } = model;
  const { stopTimeS, stopPressurePa } = blowdown.run;
  const lowest = backPressurePa * (1 + backPressureReached);
  const stopAt = Math.max(stopPressurePa, lowest);
  const marksWanted = markPressures(blowdown, start.pressurePa);

  const run: Run = { segments: [], endTimeS: 0, endedBy: "time", marks: new Map(), phaseChanges: [], steps: 0, evaluations: 0 };
  let t = 0;
  let y = balance.startState();
  let lastK = start.temperatureK;
  let subsonicSeen = 0;
  let mode: PhaseMode = start.twoPhase ? "two-phase" : "one-phase";
  const lifted = paths.map(({ relief }) => relief !== undefined && start.pressurePa >= relief.setPressurePa);
  const hasRelief = paths.some(({ relief }) => relief !== undefined);
  const emptyingTimeS = Math.min(Math.max(balance.massScaleKg / Math.max(balance.fullRateKgPerS(mode), 1e-300), 1e-9), stopTimeS);
  const footing = new PhaseFooting(balance, emptyingTimeS);

  if (balance instanceof ZonedBalance && start.twoPhase && smallerShare(balance, t, y, mode) > zonesBegin) {
    y = balance.zonesFrom(t, y);
    mode = "zones";
  }

  while (t < stopTimeS) {
    if (run.segments.length >= (hasRelief ? maxSegmentsWithRelief : maxSegments)) {
      throw new EngineError(
        "no-convergence",
        hasRelief
          ? `The relief device opened and shut ${maxSegmentsWithRelief / 2} times by ${t.toPrecision(4)} s, and the run was given up. End the run earlier, or widen the gap to its reseating pressure.`
          : `The fluid changed between one and two phases ${maxSegments} times by ${t.toPrecision(4)} s, and the run was given up. Check the pressure near the critical point.`,
        { timeS: t },
      );
    }
    const open = openPaths(paths, t, lifted);
    balance.beginSegment(open);
    const freeForS = mode === "zones" ? undefined : footing.freeForS(t, y, mode, run.phaseChanges);
    const segment: Segment = { mode: freeForS === undefined ? mode : "two-phase", open, dense: new DenseRun() };
    run.segments.push(segment);
    let samples: Float64Array[] = [];
    const sample = (time: number, state: number[]): void =>
      void samples.push(quantitiesOf(balance, state, balance.at(time, state, segment.mode)));
    if (options.keepSamples) sample(t, y);
    const until = Math.min(nextChangeS(paths, t), stopTimeS, t + (freeForS ?? Infinity));
    const stroking = paths.filter(({ opensAtS, openingTimeS }) => t >= opensAtS && t < opensAtS + openingTimeS);
    const shortestStrokeS = Math.min(emptyingTimeS, ...stroking.map(({ openingTimeS }) => openingTimeS));
    const result = integrate({
      derivative: (time, state) => balance.derivative(time, state, segment.mode),
      t0: t,
      tEnd: until,
      y0: y,
      relativeTolerance: options.relativeTolerance,
      absoluteTolerance: balance.absoluteTolerances(options.relativeTolerance, segment.mode),
      // Boiling and rain settle within a fraction of their relaxation time: the first step must not jump over that.
      timeScaleS: Math.sqrt(emptyingTimeS * shortestStrokeS) * (segment.mode === "zones" ? 0.01 : 1),
      maxEvaluations: options.maxEvaluations - run.evaluations,
      events: [
        {
          id: "stop",
          stops: true,
          value: (time, state) => balance.at(time, state, segment.mode).contents.pressurePa / stopAt - 1,
        },
        ...(freeForS !== undefined ? [] : segment.mode === "zones" ? [mergeEvent(balance)] : [phaseEvent(balance, segment.mode)]),
        ...(segment.mode === "two-phase" && balance instanceof ZonedBalance ? [partEvent(balance)] : []),
        ...(subsonicSeen < subsonicRestarts * paths.length
          ? paths.flatMap((_, i) => (open[i] ? [subsonicEvent(balance, segment.mode, i)] : []))
          : []),
        ...paths.flatMap(({ relief }, i) => (relief ? [reliefEvent(balance, segment.mode, relief, lifted[i]!, i)] : [])),
        {
          id: "too-hot",
          stops: true,
          value: (time, state) => 1 - balance.at(time, state, segment.mode).contents.temperatureK / hottestK,
        },
        ...solidEvent(balance, segment.mode, model.solids),
        ...marksWanted
          .filter(({ id }) => !run.marks.has(id))
          .map(({ id, pressurePa }): IntegrationEvent => ({
            id,
            stops: false,
            value: (time, state) => balance.at(time, state, segment.mode).contents.pressurePa / pressurePa - 1,
          })),
      ],
      places,
      onSample: options.keepSamples ? sample : undefined,
      onStep: (step) => {
        const { temperatureK, pressurePa } = balance.at(step.t1, step.y1, segment.mode).contents;
        // A step that an event has cut is evaluated again at its own points.
        const whole = samples.length === coarseCount;
        segment.dense.keep(step, [lastK, temperatureK], whole ? samples : undefined);
        samples = whole ? samples.slice(-1) : [];
        if (options.keepSamples && !whole) sample(step.t1, step.y1);
        lastK = temperatureK;
        options.onProgress?.(progress(step.t1 / stopTimeS, pressurePa, start.pressurePa, stopAt));
      },
      isCancelled: options.isCancelled,
    });
    run.steps += result.steps;
    run.evaluations += result.evaluations;
    for (const { id, t: time } of result.marks) if (!run.marks.has(id)) run.marks.set(id, time);
    t = result.t;
    y = result.y;
    if (result.stoppedBy === "stop") {
      for (const { id, pressurePa } of marksWanted) if (pressurePa === stopAt && !run.marks.has(id)) run.marks.set(id, t);
      run.endedBy = stopPressurePa >= lowest || stopPressurePa === backPressurePa ? "pressure" : "back-pressure";
      break;
    }
    if (result.stoppedBy === "solid" || result.stoppedBy === "too-hot") {
      run.endedBy = result.stoppedBy === "solid" ? "solid-phase" : "too-hot";
      break;
    }
    if (result.stoppedBy === "subsonic") subsonicSeen++;
    const moved = paths.findIndex((_, i) => result.stoppedBy === reliefId(i));
    if (moved >= 0) lifted[moved] = !lifted[moved];
    if (balance instanceof ZonedBalance && (result.stoppedBy === "part" || result.stoppedBy === "merge")) {
      y = result.stoppedBy === "part" ? balance.zonesFrom(t, y) : balance.mergedFrom(y);
      mode = result.stoppedBy === "part" ? "zones" : "two-phase";
      continue;
    }
    const found = freeForS === undefined ? undefined : balance.at(t, y, segment.mode).contents.phases;
    const changed = found === undefined ? result.stoppedBy === "phase" : (found === 2) !== (mode === "two-phase");
    if (changed) {
      mode = mode === "one-phase" ? "two-phase" : "one-phase";
      const { temperatureK, pressurePa } = balance.at(t, y, found === undefined ? mode : segment.mode).contents;
      run.phaseChanges.push({ timeS: t, to: mode, temperatureK, pressurePa });
    }
  }
  run.endTimeS = t;
  return run;
}

/** Pressures that the summary and the limits report a time for. Gauge here means above 101325 Pa. */
function markPressures(blowdown: BlowdownCase, startPa: number): { id: string; pressurePa: number }[] {
  const atmosphere = 101325;
  const wanted = [
    { id: "half-gauge", pressurePa: atmosphere + 0.5 * (startPa - atmosphere) },
    { id: "6.9-bar-gauge", pressurePa: 791325 },
  ];
  const target = blowdown.limits?.targetPressurePa;
  if (target !== undefined) wanted.push({ id: "target", pressurePa: target });
  return wanted.filter(({ pressurePa }) => pressurePa < startPa && pressurePa > 0);
}

/** Falls through zero where the pinned number of phases stops being the right one. */
function phaseEvent(balance: Balance, mode: PhaseMode): IntegrationEvent {
  return {
    id: "phase",
    stops: true,
    value: (time, state) => {
      const { contents } = balance.at(time, state, mode);
      if (mode === "two-phase") return contents.phases === 2 ? 1 : -1;
      return isStableAlone(balance.model.fluid, contents) ? 1 : -1;
    },
  };
}

/** Share of the volume of the smaller of two phases. */
function smallerShare(balance: Balance, t: number, y: number[], mode: PhaseMode): number {
  const { liquidVolumeM3 } = balance.at(t, y, mode).contents;
  const share = liquidVolumeM3 / balance.model.vessel.volumeM3;
  return Math.min(share, 1 - share);
}

/** Two phases have grown large enough for a temperature each. */
const partEvent = (balance: Balance): IntegrationEvent => ({
  id: "part",
  stops: true,
  value: (time, state) => zonesBegin - smallerShare(balance, time, state, "two-phase"),
});

/** One of two zones is all but gone. */
const mergeEvent = (balance: Balance): IntegrationEvent => ({
  id: "merge",
  stops: true,
  value: (time, state) => smallerShare(balance, time, state, "zones") / zonesEnd - 1,
});

/** Where the throat stops being sonic the rate has a kink; the integrator starts afresh there. Armed only while the flow is choked. */
function subsonicEvent(balance: Balance, mode: PhaseMode, path: number): IntegrationEvent {
  return {
    id: "subsonic",
    stops: true,
    value: (time, state) => {
      const flow = balance.at(time, state, mode).flows[path];
      // The throat's place is known to about 1e-7 of its pressure; nearer than ten times that the flow counts as subsonic.
      return flow?.choked ? flow.throatPressurePa / flow.backPressurePa - 1 - 1e-6 : -1;
    },
  };
}

const reliefId = (path: number): string => `relief-${path}`;

/** Shut: the pressure rises to the set pressure. Open: it falls to the reseating pressure. */
function reliefEvent(
  balance: Balance,
  mode: PhaseMode,
  { setPressurePa, reseatPressurePa }: { setPressurePa: number; reseatPressurePa: number },
  isOpen: boolean,
  path: number,
): IntegrationEvent {
  return {
    id: reliefId(path),
    stops: true,
    value: (time, state) => {
      const { pressurePa } = balance.at(time, state, mode).contents;
      return isOpen ? pressurePa / reseatPressurePa - 1 : 1 - pressurePa / setPressurePa;
    },
  };
}

function solidEvent(balance: Balance, mode: PhaseMode, curves: readonly SolidCurve[]): IntegrationEvent[] {
  if (curves.length === 0) return [];
  return [
    {
      id: "solid",
      stops: true,
      value: (time, state) => solidMargin(balance.model.fluid, balance.at(time, state, mode).contents, curves),
    },
  ];
}

function progress(timePart: number, pressurePa: number, startPa: number, stopPa: number): number {
  const fallen = Math.log(startPa / pressurePa) / Math.log(startPa / stopPa);
  return Math.min(Math.max(timePart, fallen, 0), 1);
}

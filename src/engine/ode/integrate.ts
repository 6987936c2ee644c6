/**
 * Integrates dy/dt = f(t, y) with odex behind the guards it needs, and finds events on its dense output.
 *
 * odex takes NaN for convergence, doesn't enforce its step limit everywhere, reports the requested end after an early stop, steps over
 * two events at once, and starts no smaller than 1e-4 of whatever time is (hence `timeScaleS`). Each of these has a test beside this file.
 *
 * f must be a pure function of (t, y): odex keeps the last derivative, so a flag flipped inside f makes it halve its step for ever.
 * Where the right-hand side changes its form, stop at an event and start again.
 */
import { EngineError } from "../errors";
import { bracketedRoot } from "./bracketed-root";
import { Outcome, Solver } from "./odex-port";

/** Fires where `value` falls through zero from above. One that starts at or below zero is armed only once it has been positive. */
export type IntegrationEvent = {
  id: string;
  value: (t: number, y: number[]) => number;
  /** End the integration there. Otherwise the first crossing is noted and the run goes on. */
  stops: boolean;
};

/** One accepted step, cut at the event that ends it. `at` holds inside the callback only: the solver overwrites its buffer. */
export type AcceptedStep = { t0: number; y0: readonly number[]; t1: number; y1: number[]; at: (t: number) => number[] };

export type IntegrateOptions = {
  /** dy/dt, length of y. `undefined` means "this trial state cannot be evaluated": the step is rejected and shortened. */
  derivative: (t: number, y: number[]) => ArrayLike<number> | undefined;
  t0: number;
  tEnd: number;
  y0: readonly number[];
  relativeTolerance: number;
  /** One for each component, all above zero. */
  absoluteTolerance: readonly number[];
  /** Characteristic time of the problem; the first step is a thousandth of it. */
  timeScaleS: number;
  maxEvaluations: number;
  events?: readonly IntegrationEvent[];
  /** Places inside each step at which events are looked at, rising from above 0 to 1, its end. */
  places?: readonly number[];
  /** Called after the events were looked at there, with what they were given. A step that an event ends has had places beyond its end. */
  onSample?: (t: number, y: number[]) => void;
  onStep?: (step: AcceptedStep) => void;
  isCancelled?: () => boolean;
};

export type Integration = {
  t: number;
  y: number[];
  stoppedBy: string | undefined;
  marks: { id: string; t: number; y: number[] }[];
  steps: number;
  evaluations: number;
};

const untenable = 1e15;
const untenableInARow = 400;
const sevenths: readonly number[] = Array.from({ length: 7 }, (_, k) => (k + 1) / 7);

/**
 * Throws "cancelled"; "no-convergence" when the budget is spent, a derivative or an accepted state is not finite, or the solver gives up;
 * RangeError for arguments that fit no problem (a fault of the caller).
 */
export function integrate(options: IntegrateOptions): Integration {
  const {
    derivative,
    t0,
    tEnd,
    timeScaleS,
    maxEvaluations,
    events = [],
    places = sevenths,
    onSample,
    onStep,
    isCancelled,
  } = options;
  const n = options.y0.length;
  checkArguments(options);

  let evaluations = 0;
  let refusedInARow = 0;
  let accepted = { t: t0, y: [...options.y0] };
  const f = (x: number, y: number[]): ArrayLike<number> => {
    if (isCancelled?.()) throw new EngineError("cancelled", "The calculation was cancelled.", { timeS: accepted.t });
    if (++evaluations > maxEvaluations) {
      throw new EngineError(
        "no-convergence",
        `The calculation needed more than ${maxEvaluations} evaluations and was stopped at ${accepted.t.toPrecision(4)} s. Loosen the tolerance, or shorten the run.`,
        { timeS: accepted.t, evaluations },
      );
    }
    const rates = derivative(t0 + x * timeScaleS, y);
    const scaled = new Array<number>(n);
    if (rates === undefined) {
      if (evaluations === 1 || ++refusedInARow > untenableInARow) {
        throw new EngineError(
          "no-convergence",
          `No state of the fluid could be found just after ${accepted.t.toPrecision(4)} s.`,
          { timeS: accepted.t },
        );
      }
      return scaled.fill(untenable);
    }
    refusedInARow = 0;
    for (let i = 0; i < n; i++) {
      const rate = rates[i];
      if (rate === undefined || !Number.isFinite(rate)) {
        throw new EngineError("no-convergence", `A rate of change was not a number just after ${accepted.t.toPrecision(4)} s.`, {
          timeS: accepted.t,
          component: i,
        });
      }
      scaled[i] = rate * timeScaleS;
    }
    return scaled;
  };

  const watch = new EventWatch(events, t0, accepted.y);
  let steps = 0;
  let stoppedBy: string | undefined;
  const out = (nr: number, xOld: number, x: number, y: number[], dense?: (component: number, x: number) => number): boolean => {
    if (nr === 1 || !dense) return true;
    if (!y.every(Number.isFinite))
      throw new EngineError("no-convergence", `The state was not a number after ${accepted.t.toPrecision(4)} s.`, {
        timeS: accepted.t,
      });
    const told = accepted.t;
    const t = x >= xEnd ? tEnd : t0 + x * timeScaleS;
    const at = (time: number): number[] => {
      if (time >= t) return [...y];
      const place = Math.min(Math.max((time - t0) / timeScaleS, xOld), x);
      return Array.from({ length: n }, (_, i) => dense(i, place));
    };
    const stop = watch.look({ told, t, at, places, onSample });
    const end = stop ? { t: stop.t, y: stop.y } : { t, y: [...y] };
    steps++;
    onStep?.({ t0: told, y0: accepted.y, t1: end.t, y1: end.y, at });
    accepted = end;
    stoppedBy = stop?.id;
    return !stop;
  };

  const xEnd = (tEnd - t0) / timeScaleS;
  if (xEnd > 0) {
    const solver = new Solver(n);
    solver.denseOutput = true;
    solver.relativeTolerance = new Array<number>(n).fill(options.relativeTolerance);
    solver.absoluteTolerance = [...options.absoluteTolerance];
    solver.initialStepSize = Math.min(1e-3, xEnd);
    solver.maxSteps = maxEvaluations;
    const { outcome } = solver.solve(f, 0, [...options.y0], xEnd, out);
    // On an early stop the solver's own `xEnd` and `y` are not those of the event: only what `out` kept counts.
    if (outcome === Outcome.MaxStepsExceeded || (stoppedBy === undefined && accepted.t < tEnd)) {
      throw new EngineError("no-convergence", `The integration could not get past ${accepted.t.toPrecision(4)} s.`, {
        timeS: accepted.t,
        steps,
      });
    }
  }
  return { t: accepted.t, y: accepted.y, stoppedBy, marks: watch.marks, steps, evaluations };
}

function checkArguments({
  t0,
  tEnd,
  y0,
  relativeTolerance,
  absoluteTolerance,
  timeScaleS,
  maxEvaluations,
}: IntegrateOptions): void {
  if (y0.length === 0 || !y0.every(Number.isFinite)) throw new RangeError("the initial state must be finite numbers");
  if (absoluteTolerance.length !== y0.length || !absoluteTolerance.every((a) => a > 0))
    throw new RangeError("one absolute tolerance above zero for each component");
  if (!(relativeTolerance > 0 && timeScaleS > 0 && maxEvaluations > 0))
    throw new RangeError("tolerance, time scale and budget must be above zero");
  if (!(tEnd >= t0)) throw new RangeError("the end must not be before the start");
}

/** The root from the side that the event leads to, so that a restart there doesn't meet it again. */
function farSide(f: (t: number) => number, bracket: { a: number; fa: number; b: number; fb: number }, tolerance: number): number {
  let place = bracketedRoot(f, bracket, tolerance);
  for (let step = tolerance; place < bracket.b && f(place) > 0; step *= 2) place = Math.min(place + step, bracket.b);
  return place;
}

/** Looks for the earliest stopping event of a step and notes the others that come before it. */
class EventWatch {
  readonly marks: { id: string; t: number; y: number[] }[] = [];
  private readonly last: number[];
  private readonly done = new Set<string>();

  constructor(
    private readonly events: readonly IntegrationEvent[],
    t0: number,
    y0: number[],
  ) {
    this.last = events.map((event) => event.value(t0, y0));
  }

  look({
    told,
    t,
    at,
    places,
    onSample,
  }: {
    told: number;
    t: number;
    at: (t: number) => number[];
    places: readonly number[];
    onSample: ((t: number, y: number[]) => void) | undefined;
  }): { id: string; t: number; y: number[] } | undefined {
    if (this.events.length === 0) return undefined;
    let from = told;
    for (const place of places) {
      const to = place === 1 ? t : told + (t - told) * place;
      const y = at(to);
      const found: { event: IntegrationEvent; t: number }[] = [];
      this.events.forEach((event, i) => {
        const before = this.last[i] ?? Number.NaN;
        const now = event.value(to, y);
        if (before > 0 && now <= 0 && !this.done.has(event.id)) {
          found.push({
            event,
            t: farSide(
              (time) => event.value(time, at(time)),
              { a: from, fa: before, b: to, fb: now },
              1e-10 * Math.max(to, 1e-3 * (t - told)),
            ),
          });
        }
        this.last[i] = now;
      });
      if (found.length === 0) onSample?.(to, y);
      found.sort((p, q) => p.t - q.t);
      for (const { event, t: when } of found) {
        const hit = { id: event.id, t: when, y: at(when) };
        if (event.stops) return hit;
        this.marks.push(hit);
        this.done.add(event.id);
      }
      from = to;
    }
    return undefined;
  }
}

import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { EngineError } from "../errors";
import { bracketedRoot } from "./bracketed-root";
import { integrate, type IntegrateOptions } from "./integrate";

const decay = (over: Partial<IntegrateOptions> = {}): IntegrateOptions => ({
  derivative: (_t, y) => [-(y[0] ?? 0)],
  t0: 0,
  tEnd: 5,
  y0: [1],
  relativeTolerance: 1e-9,
  absoluteTolerance: [1e-11],
  timeScaleS: 1,
  maxEvaluations: 20000,
  ...over,
});

const codeOf = (work: () => unknown): string => {
  try {
    work();
  } catch (error) {
    return error instanceof EngineError ? error.code : String(error);
  }
  return "no error";
};

describe("integrate", () => {
  it("follows a decay to its exact end", () => {
    const { t, y, stoppedBy } = integrate(decay());
    expect(t).toBe(5);
    expect(stoppedBy).toBeUndefined();
    expect(Math.abs((y[0] ?? 0) / Math.exp(-5) - 1)).toBeLessThan(1e-7);
  });

  it("gives the same answer whatever the time scale, down to microseconds", () => {
    const fast = integrate(decay({ derivative: (_t, y) => [-1e6 * (y[0] ?? 0)], tEnd: 5e-6, timeScaleS: 1e-6 }));
    expect(Math.abs((fast.y[0] ?? 0) / Math.exp(-5) - 1)).toBeLessThan(1e-7);
  });

  it("moves the answer less than tolerance claims when tightened tenfold", () => {
    for (const relativeTolerance of [1e-4, 1e-5, 1e-6, 1e-7]) {
      const [loose, tight] = [relativeTolerance, relativeTolerance / 10].map(
        (r) => integrate(decay({ relativeTolerance: r, absoluteTolerance: [r / 100] })).y[0] ?? 0,
      );
      expect(Math.abs((loose ?? 0) - (tight ?? 0))).toBeLessThan(10 * relativeTolerance * Math.exp(-5) + relativeTolerance / 10);
    }
  });

  it.each([
    ["from the start", (_t: number) => Number.NaN],
    ["from some time on", (t: number) => (t > 2 ? Number.NaN : -1)],
    ["in the last step only", (t: number) => (t > 4.999 ? Number.NaN : -1)],
    ["as infinity", (t: number) => (t > 2 ? Number.POSITIVE_INFINITY : -1)],
  ])("refuses a right-hand side that is not a number %s", (_when, rate) => {
    expect(codeOf(() => integrate(decay({ derivative: (t) => [rate(t)] })))).toBe("no-convergence");
  });

  it("refuses a blow-up in finite time", () => {
    expect(codeOf(() => integrate(decay({ derivative: (_t, y) => [(y[0] ?? 0) ** 2], tEnd: 2 })))).toBe("no-convergence");
  });

  it("stops when the budget of evaluations is spent, first and last step included", () => {
    let calls = 0;
    const stiff = decay({ derivative: (t, y) => (calls++, [-1e5 * ((y[0] ?? 0) - Math.cos(t))]), maxEvaluations: 500 });
    expect(codeOf(() => integrate(stiff))).toBe("no-convergence");
    expect(calls).toBe(500);
  });

  it("refuses too few derivatives, too few tolerances and a zero tolerance by name", () => {
    expect(codeOf(() => integrate(decay({ derivative: () => [] })))).toBe("no-convergence");
    expect(() => integrate(decay({ absoluteTolerance: [] }))).toThrow(RangeError);
    expect(() => integrate(decay({ absoluteTolerance: [0] }))).toThrow(RangeError);
    expect(() => integrate(decay({ y0: [Number.NaN] }))).toThrow(RangeError);
  });

  it("ends at the event, not at the end of the step that passed it", () => {
    const stop = integrate(decay({ tEnd: 1e6, events: [{ id: "tenth", stops: true, value: (_t, y) => (y[0] ?? 0) - 0.1 }] }));
    expect(stop.stoppedBy).toBe("tenth");
    expect(Math.abs(stop.t - Math.log(10))).toBeLessThan(1e-6);
    expect(Math.abs((stop.y[0] ?? 0) - 0.1)).toBeLessThan(1e-9);
  });

  it("takes the earliest of several events in one step, whatever their order in the list", () => {
    const at = (id: string, level: number, stops: boolean) => ({
      id,
      stops,
      value: (_t: number, y: number[]) => (y[0] ?? 0) - level,
    });
    fc.assert(
      fc.property(fc.shuffledSubarray([0.9, 0.5, 0.49, 0.3, 0.1], { minLength: 2 }), (levels) => {
        const run = integrate(
          decay({
            relativeTolerance: 1e-3,
            absoluteTolerance: [1e-3],
            tEnd: 50,
            events: levels.map((level) => at(String(level), level, true)),
          }),
        );
        expect(run.stoppedBy).toBe(String(Math.max(...levels)));
      }),
      { numRuns: 30 },
    );
    const marked = integrate(decay({ events: [at("late", 0.1, false), at("early", 0.5, false), at("end", 0.05, true)] }));
    expect(marked.marks.map((mark) => mark.id)).toEqual(["early", "late"]);
    expect(marked.stoppedBy).toBe("end");
  });

  it("sees a dip that starts and ends inside one step", () => {
    const run = integrate(
      decay({
        derivative: () => [1],
        y0: [0],
        tEnd: 10,
        events: [{ id: "dip", stops: true, value: (_t, y) => Math.abs((y[0] ?? 0) - 5) - 0.9 }],
      }),
    );
    expect(run.stoppedBy).toBe("dip");
    expect(run.t).toBeCloseTo(4.1, 8);
  });

  it("does not fire an event again that it was restarted on", () => {
    const level = { id: "half", stops: true, value: (_t: number, y: number[]) => (y[0] ?? 0) - 0.5 };
    const first = integrate(decay({ events: [level] }));
    const second = integrate(decay({ t0: first.t, y0: first.y, events: [level] }));
    expect(first.stoppedBy).toBe("half");
    expect(second.stoppedBy).toBeUndefined();
    expect(Math.abs((second.y[0] ?? 0) / Math.exp(-5) - 1)).toBeLessThan(1e-6);
  });

  it("ends on the far side of an event that is a jump, so that a restart does not meet it again", () => {
    const value = (_t: number, y: number[]) => ((y[0] ?? 0) > 0.37 ? 1 : -1);
    const run = integrate(decay({ events: [{ id: "jump", stops: true, value }] }));
    expect(run.stoppedBy).toBe("jump");
    expect(value(run.t, run.y)).toBe(-1);
    expect(Math.abs(run.t + Math.log(0.37))).toBeLessThan(1e-8);
  });

  it("hands over steps that join, with dense output as good as the ends", () => {
    let end = 0;
    let worst = 0;
    integrate(
      decay({
        onStep: ({ t0, t1, at }) => {
          expect(t0).toBe(end);
          for (let k = 0; k <= 10; k++) {
            const t = t0 + ((t1 - t0) * k) / 10;
            worst = Math.max(worst, Math.abs((at(t)[0] ?? 0) - Math.exp(-t)));
          }
          end = t1;
        },
      }),
    );
    expect(end).toBe(5);
    expect(worst).toBeLessThan(1e-7);
  });

  it("shortens the step where a trial state cannot be evaluated, and goes on", () => {
    // y' = -√y reaches zero at t = 2; trial stages overshoot below it.
    const run = integrate(
      decay({
        derivative: (_t, y) => ((y[0] ?? 0) < 0 ? undefined : [-Math.sqrt(y[0] ?? 0)]),
        events: [{ id: "low", stops: true, value: (_t, y) => (y[0] ?? 0) - 0.01 }],
      }),
    );
    expect(run.stoppedBy).toBe("low");
    expect(run.t).toBeCloseTo(1.8, 6);
    expect(codeOf(() => integrate(decay({ derivative: (t) => (t > 1 ? undefined : [-1]) })))).toBe("no-convergence");
  });

  it("stops at once when cancelled", () => {
    let calls = 0;
    expect(
      codeOf(() => integrate(decay({ derivative: (_t, y) => (calls++, [-(y[0] ?? 0)]), isCancelled: () => calls >= 7 }))),
    ).toBe("cancelled");
    expect(calls).toBe(7);
  });

  it("gives the same digits twice", () => {
    expect(integrate(decay())).toEqual(integrate(decay()));
  });
});

describe("bracketedRoot", () => {
  it("finds the root of a smooth function and the place of a jump", () => {
    expect(bracketedRoot((x) => Math.cos(x) - x, { a: 0, fa: 1, b: 1, fb: Math.cos(1) - 1 }, 1e-12)).toBeCloseTo(
      0.7390851332151607,
      11,
    );
    expect(bracketedRoot((x) => (x < 0.3 ? 1 : -1), { a: 0, fa: 1, b: 1, fb: -1 }, 1e-10)).toBeCloseTo(0.3, 9);
  });
  it("refuses ends that bracket nothing", () => {
    expect(() => bracketedRoot((x) => x, { a: 1, fa: 1, b: 2, fb: 2 }, 1e-9)).toThrow(/bracket no root/);
    expect(() => bracketedRoot((x) => x, { a: 1, fa: Number.NaN, b: 2, fb: 2 }, 1e-9)).toThrow(RangeError);
  });
});

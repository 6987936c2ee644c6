import { describe, expect, it } from "vitest";
import { plainCase } from "../../../tests/fixtures/blowdowns";
import { idealGas } from "../../../tests/fixtures/fluids";
import type { BlowdownCase } from "../cases/blowdown-case";
import { runBlowdown } from "../cases/blowdown/run-blowdown";

const base = plainCase(idealGas(1.4, 0.028), { pressurePa: 5e6, stopPressurePa: 2e5 });
const run = (limits: BlowdownCase["limits"], stopTimeS = 1e6) =>
  runBlowdown({ ...base, run: { ...base.run, stopTimeS }, limits });
const line = (result: ReturnType<typeof run>, id: string) => result.limits.find((limit) => limit.id === id);

describe("figures held against the limits", () => {
  it("times the first crossing of the target", () => {
    const result = run({ targetPressurePa: 1e6, targetTimeS: 900 });
    expect(line(result, "time-to-target")?.value).toBe(result.summary.timeToTargetPressureS);
  });

  it("calls a target that was not met in the time allowed Beyond", () => {
    const result = run({ targetPressurePa: 1e6, targetTimeS: 20 }, 30);
    expect(line(result, "time-to-target")).toMatchObject({
      verdict: "beyond",
      value: 30,
      note: expect.stringMatching(/Not reached/) as string,
    });
    expect(result.verdict).toBe("beyond");
  });

  it("leaves a target Open when the run was cut short before the time allowed", () => {
    expect(line(run({ targetPressurePa: 1e6, targetTimeS: 900 }, 5), "time-to-target")).toMatchObject({
      verdict: "open",
      note: expect.stringMatching(/Compute for longer/) as string,
    });
  });

  it("is Open overall without a wall, because nothing was said about the steel", () => {
    const result = run({ targetPressurePa: 1e6, targetTimeS: 900, ventCapacityKgPerS: 100 });
    expect(line(result, "minimum-wall-temperature")?.verdict).toBe("open");
    expect(line(result, "peak-vent-rate")?.verdict).toBe("within");
    expect(result.verdict).toBe("open");
  });

  it("holds the outlet and the load against their limits where they are entered", () => {
    const { limits } = run({ minimumOutletTemperatureK: 290, ventCapacityKgPerS: 0.1 });
    expect(limits.find((limit) => limit.id === "minimum-outlet-temperature")?.verdict).toBe("beyond");
    expect(limits.find((limit) => limit.id === "peak-vent-rate")?.verdict).toBe("beyond");
  });
});

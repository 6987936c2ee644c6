import { describe, expect, it } from "vitest";
import { parseCase } from "./case-file";

const of = {
  format: "ebbmark-case/1",
  kind: "blowdown",
  fluid: { components: [{ id: "nitrogen", moleFraction: 1 }], equation: "peng-robinson-1976" },
  vessel: { geometry: { shape: "volume", volumeM3: 1 } },
  start: { pressurePa: 5e6, temperatureK: 300 },
  release: { path: "orifice", diameterM: 0.01, dischargeCoefficient: 0.85 },
  run: { stopTimeS: 600, stopPressurePa: 2e5 },
};
const head = { format: "ebbmark-case/1", kind: "study", of };
const pathsOf = (document: object) => {
  const parsed = parseCase(document);
  return parsed.ok ? [] : parsed.problems.map(({ path }) => path);
};

describe("cases that hold cases", () => {
  it("write out the defaults of a study and of the case inside", () => {
    const parsed = parseCase({ ...head, study: "percentiles" });
    expect(parsed.ok && parsed.document).toMatchObject({
      samples: 100,
      seed: 1,
      of: { release: { backPressurePa: 101325 }, run: { relativeTolerance: 1e-6 } },
    });
  });

  it.each<[object, string]>([
    [{ study: "guess" }, "study"],
    [{ study: "spread", equations: [] }, "equations"],
    [{ study: "spread", equations: ["best"] }, "equations[0]"],
    [{ study: "tornado", inputs: [{ input: "colour", low: 0, high: 1 }] }, "inputs[0].input"],
    [{ study: "percentiles", samples: 2.5 }, "samples"],
    [{ study: "percentiles", samples: 1e6 }, "samples"],
    [{ study: "percentiles", seed: -1 }, "seed"],
    [
      { study: "percentiles", inputs: [{ input: "volume", low: 0.9, high: 1.1, distribution: "normal" }] },
      "inputs[0].distribution",
    ],
    [{ study: "tornado", samples: 5 }, "samples"],
    [{ study: "tornado", of: { ...of, start: { pressurePa: 5e6 } } }, "of.start"],
    [{ study: "tornado", of: { ...of, run: { stopTimeS: 600, stopPressurePa: 6e6 } } }, "of.run.stopPressurePa"],
  ])("refuse %j with its path", (over, path) => expect(pathsOf({ ...head, ...over })).toContain(path));

  it.each<[object, string]>([
    [{ rangeM: [0.02, 0.01] }, "rangeM"],
    [{ chosenDiameterM: 0 }, "chosenDiameterM"],
    [{ cold: { ...of, kind: "path" } }, "cold.kind"],
    [{ warm: of }, "warm"],
  ])("refuse a sizing with %j", (over, path) =>
    expect(pathsOf({ format: "ebbmark-case/1", kind: "sizing", fire: of, ...over })).toContain(path),
  );
});

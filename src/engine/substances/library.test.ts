import { describe, expect, it } from "vitest";
import { gasConstant } from "../gas-constant";
import { createIdealGasModel } from "../eos/ideal-gas";
import table from "./data/kij.json";
import { libraryInteraction } from "./interaction";
import { libraryIds, libraryRows, librarySubstance } from "./library";

describe("the component library", () => {
  it("has unique ids and physical constants", () => {
    expect(new Set(libraryIds).size).toBe(libraryRows.length);
    expect(libraryRows.length).toBe(48);
    for (const row of libraryRows) {
      expect(row.Tc_K, row.id).toBeGreaterThan(row.triplePoint.T_K);
      const Zc = (row.Pc_Pa * row.Vc_m3_per_mol) / (gasConstant * row.Tc_K);
      expect(Zc, row.id).toBeGreaterThan(0.2);
      expect(Zc, row.id).toBeLessThan(0.32);
      expect(row.sources.critical.length, row.id).toBeGreaterThan(10);
    }
  });

  it("gives ideal-gas heat capacities of published size (NIST-JANAF and NIST WebBook, from memory, J/(mol K) at 298.15 K)", () => {
    const published: Record<string, number> = {
      methane: 35.69,
      nitrogen: 29.12,
      carbon_dioxide: 37.13,
      water: 33.59,
      hydrogen: 28.84,
      propane: 73.6,
    };
    for (const [id, value] of Object.entries(published)) {
      const substance = librarySubstance(libraryRows.find((row) => row.id === id)!);
      const cp = new Float64Array(1);
      createIdealGasModel([substance.heatCapacity]).evaluate(298.15, cp, new Float64Array(1), new Float64Array(1));
      expect(Math.abs(cp[0]! / value - 1), id).toBeLessThan(0.005);
    }
  });

  it("names only library components in its interaction parameters, each pair once, both ways round", () => {
    const pairs = (table as unknown as { pairs: { i: string; j: string; PR: number }[] }).pairs;
    const seen = new Set<string>();
    for (const { i, j, PR } of pairs) {
      expect(libraryIds).toContain(i);
      expect(libraryIds).toContain(j);
      const key = [i, j].sort().join("|");
      expect(seen.has(key), key).toBe(false);
      seen.add(key);
      expect(libraryInteraction(i, j, "PR")!.kij).toBe(PR);
      expect(libraryInteraction(j, i, "PR")!.kij).toBe(PR);
    }
    expect(libraryInteraction("methane", "no_such", "PR")).toBeUndefined();
  });
});

describe("ideal-gas functions", () => {
  const substances = libraryRows.map(librarySubstance);
  const count = substances.length;
  const model = createIdealGasModel(substances.map(({ heatCapacity }) => heatCapacity));
  const at = (T: number) => {
    const [cp, h, s] = [new Float64Array(count), new Float64Array(count), new Float64Array(count)];
    model.evaluate(T, cp, h, s);
    return { cp, h, s };
  };

  it("are zero at 298.15 K", () => {
    const { h, s } = at(298.15);
    h.forEach((value) => expect(Math.abs(value)).toBeLessThan(1e-9));
    s.forEach((value) => expect(Math.abs(value)).toBeLessThan(1e-12));
  });

  it.each([20, 90, 150, 273.15, 400, 900, 1500])("have dh/dT = cp and ds/dT = cp/T at %d K, and stay finite in the cold", (T) => {
    const step = T * 1e-4;
    const [low, middle, high] = [at(T - step), at(T), at(T + step)];
    for (let i = 0; i < count; i++) {
      const slope = (high.h[i]! - low.h[i]!) / (2 * step);
      expect(Math.abs(slope / middle.cp[i]! - 1), substances[i]!.id).toBeLessThan(1e-6);
      const slopeS = (high.s[i]! - low.s[i]!) / (2 * step);
      expect(Math.abs((slopeS * T) / middle.cp[i]! - 1), substances[i]!.id).toBeLessThan(1e-6);
    }
  });
});

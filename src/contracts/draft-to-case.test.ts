import { describe, expect, it } from "vitest";
import { newDraft, type DraftDocument } from "./draft";
import { caseFromDraft, type SiteFacts } from "./draft-to-case";
import { defaultPolicy } from "./policy";

const site: SiteFacts = { barometricPressurePa: 100000, policy: defaultPolicy };
const sheet = { kind: "sheet", note: "DS-5201 rev A" } as const;

function completeDraft(): DraftDocument {
  const draft = newDraft("Bottle bank, cold");
  const set = (key: string, typed: string, unit: string | null, si: number | null) => {
    draft.lines[key] = { typed, unit, si, source: sheet };
  };
  set("2.01-1", "B-5201", null, null);
  set("2.02-1", "volume", null, null);
  set("2.06-1", "0.5", "m³", 0.5);
  set("4.04", "6", "m²", 6);
  set("4.03", "12", "mm", 0.012);
  set("4.05", "-46", "°C", 227.15);
  set("2.09", "200", "bar(g)", 20.1e6);
  set("2.10", "15", "°C", 288.15);
  set("A5.02", "6", "mm", 0.006);
  set("A6.08", "30", "W/(m²·K)", 30);
  draft.composition = { rows: [{ id: "nitrogen", typed: "100", molePercent: 100 }], normalised: false, source: sheet };
  return draft;
}

describe("caseFromDraft", () => {
  it("makes one case of a complete draft, with the policy's limits above the site's own barometer", () => {
    const { document, missing, problems, withoutSource } = caseFromDraft(completeDraft(), "A", site);
    expect({ missing, problems, withoutSource }).toEqual({ missing: [], problems: [], withoutSource: [] });
    expect(document?.start).toEqual({ pressurePa: 20.1e6, temperatureK: 288.15 });
    expect(document?.limits?.targetPressurePa).toBe(790000);
    expect(document?.release).toMatchObject({ diameterM: 0.006, dischargeCoefficient: 0.84 });
    expect(document?.vessel.wall).toMatchObject({ steel: "carbon_steel", minimumDesignMetalTemperatureK: 227.15 });
  });

  it("names every missing line and makes no case", () => {
    const draft = completeDraft();
    delete draft.lines["A5.02"];
    delete draft.lines["2.09"];
    const made = caseFromDraft(draft, "A", site);
    expect(made.document).toBeUndefined();
    expect(made.missing).toEqual(["2.09", "A5.02"]);
  });

  it("does not ask for the wall where there is none", () => {
    const draft = completeDraft();
    draft.lines["4.08"] = { typed: "none", unit: null, si: null, source: null };
    for (const key of ["4.03", "4.04", "4.05", "A6.08"]) delete draft.lines[key];
    const { document, missing } = caseFromDraft(draft, "A", site);
    expect(missing).toEqual([]);
    expect(document?.vessel.wall).toBeUndefined();
    expect(document?.heat.wall).toEqual({ model: "none" });
    expect(document?.limits?.minimumMetalMarginK).toBeUndefined();
  });

  it("refuses a sum that is far from 100 and asks for an act when it is near", () => {
    const far = completeDraft();
    far.composition.rows = [{ id: "methane", typed: "70", molePercent: 70 }];
    expect(caseFromDraft(far, "A", site).problems[0]).toMatchObject({ line: "3.01" });

    const near = completeDraft();
    near.composition.rows = [{ id: "methane", typed: "99.5", molePercent: 99.5 }];
    expect(caseFromDraft(near, "A", site).problems[0]?.message).toContain("Normalise");
    near.composition.normalised = true;
    expect(caseFromDraft(near, "A", site).document?.fluid.components).toEqual([{ id: "methane", moleFraction: 1 }]);
  });

  it.each([
    ["A5.04", 21e6, "back pressure"],
    ["A7.11", 21e6, "end below"],
    ["A7.09", 21e6, "target pressure"],
    ["A5.02", 1.9, "larger than the vessel"],
  ])("checks line %s against the others", (key, si, words) => {
    const draft = completeDraft();
    draft.lines[key] = { typed: "x", unit: null, si, source: sheet };
    const { document, problems } = caseFromDraft(draft, "A", site);
    expect(document).toBeUndefined();
    expect(problems).toHaveLength(1);
    expect(problems[0]?.message).toContain(words);
  });

  it("refuses what is not a number, not finite or out of range, by line", () => {
    for (const si of [null, Number.NaN, Number.POSITIVE_INFINITY, -1]) {
      const draft = completeDraft();
      draft.lines["4.03"] = { typed: "abc", unit: "mm", si, source: sheet };
      expect(caseFromDraft(draft, "A", site).problems.map((problem) => problem.line)).toEqual(["4.03"]);
    }
  });

  it("lists used figures that nobody gave a source for, without refusing to compute", () => {
    const draft = completeDraft();
    const bore = draft.lines["A5.02"];
    if (bore) bore.source = null;
    const made = caseFromDraft(draft, "A", site);
    expect(made.document).toBeDefined();
    expect(made.withoutSource).toEqual(["A5.02"]);
  });
});

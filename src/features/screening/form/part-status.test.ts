import { describe, expect, it } from "vitest";
import { newDraft } from "@/contracts/draft";
import { caseFromDraft } from "@/contracts/draft-to-case";
import { defaultPolicy } from "@/contracts/policy";
import { firstInTheWay, partStatuses } from "./part-status";

const site = { barometricPressurePa: 101325, policy: defaultPolicy };
const statusOf = (draft: ReturnType<typeof newDraft>, part: number) =>
  partStatuses(draft, "A", caseFromDraft(draft, "A", site)).find((status) => status.part === part);

describe("the parts of a draft", () => {
  it("of a new draft: scope and limits settled, the rest begun", () => {
    const draft = newDraft("t");
    expect(statusOf(draft, 1)?.state).toBe("settled");
    expect(statusOf(draft, 2)).toMatchObject({ state: "started", firstOpen: "2.01-1" });
    expect(statusOf(draft, 7)?.state).toBe("settled");
    expect(firstInTheWay([{ made: caseFromDraft(draft, "A", site) }])).toBe("2.01-1");
  });

  it("name what is wrong before what is missing", () => {
    const draft = newDraft("t");
    draft.lines["2.09"] = { typed: "abc", unit: "bar(g)", si: null, source: null };
    expect(statusOf(draft, 2)).toMatchObject({ state: "to-fix", note: "1 line to fix", firstOpen: "2.09" });
    expect(firstInTheWay([{ made: caseFromDraft(draft, "A", site) }])).toBe("2.09");
  });

  it("say what has no source once all else is there", () => {
    const draft = newDraft("t");
    draft.lines["A6.08"] = { typed: "25", unit: "W/(m²·K)", si: 25, source: null };
    expect(statusOf(draft, 6)).toMatchObject({ state: "without-source", note: "1 without source" });
  });
});

import { describe, expect, it } from "vitest";
import { newDraft, type DraftDocument } from "@/contracts/draft";
import { applyChoices, mergeDrafts } from "./merge";

const typed = (draft: DraftDocument, key: string, text: string): DraftDocument => ({
  ...draft,
  lines: { ...draft.lines, [key]: { typed: text, unit: null, si: null, source: null } },
});

const base = typed(newDraft("t"), "2.01-1", "V-1");

describe("mergeDrafts", () => {
  it("keeps what each side changed alone and names what it took over", () => {
    const merge = mergeDrafts(base, typed(base, "4.03", "25"), typed(base, "2.09", "84"));
    expect(merge.conflicts).toEqual([]);
    expect(merge.taken).toEqual(["2.09"]);
    expect(merge.merged.lines["4.03"]?.typed).toBe("25");
    expect(merge.merged.lines["2.09"]?.typed).toBe("84");
  });

  it("leaves a line that both changed to the person, and loses neither", () => {
    const [mine, theirs] = [typed(base, "2.01-1", "V-2"), typed(base, "2.01-1", "V-3")];
    const merge = mergeDrafts(base, mine, theirs);
    expect(merge.conflicts).toEqual(["2.01-1"]);
    expect(applyChoices(merge, theirs, { "2.01-1": "mine" }).lines["2.01-1"]?.typed).toBe("V-2");
    expect(applyChoices(merge, theirs, { "2.01-1": "theirs" }).lines["2.01-1"]?.typed).toBe("V-3");
  });

  it("sees no conflict where both typed the same", () => {
    const both = typed(base, "2.01-1", "V-2");
    expect(mergeDrafts(base, both, both)).toMatchObject({ conflicts: [], taken: [] });
  });

  it("lets a line be emptied by one side", () => {
    const theirs: DraftDocument = { ...base, lines: { ...base.lines } };
    delete theirs.lines["2.01-1"];
    expect(mergeDrafts(base, base, theirs).merged.lines["2.01-1"]).toBeUndefined();
  });

  it("treats the composition as one line", () => {
    const with_ = (percent: number): DraftDocument => ({
      ...base,
      composition: { rows: [{ id: "methane", typed: String(percent), molePercent: percent }], normalised: false, source: null },
    });
    const merge = mergeDrafts(base, with_(90), with_(80));
    expect(merge.conflicts).toEqual(["3.01"]);
    expect(applyChoices(merge, with_(80), { "3.01": "theirs" }).composition.rows[0]?.molePercent).toBe(80);
  });

  it("takes its own words back from the server for nobody else's", () => {
    const sent = typed(base, "2.01-1", "V-2");
    expect(mergeDrafts(base, typed(base, "2.01-1", "V-21"), sent).conflicts).toEqual(["2.01-1"]);
    const merge = mergeDrafts(base, typed(base, "2.01-1", "V-21"), sent, [sent]);
    expect(merge.conflicts).toEqual([]);
    expect(merge.merged.lines["2.01-1"]?.typed).toBe("V-21");
  });

  it("does not mind the order in which a database keeps keys", () => {
    const stored: DraftDocument = {
      ...base,
      lines: { ...base.lines, "2.01-1": { source: null, si: null, unit: null, typed: "V-1" } },
    };
    expect(mergeDrafts(base, typed(base, "2.01-1", "V-2"), stored).conflicts).toEqual([]);
  });
});

import { describe, expect, it } from "vitest";
import { newDraft, type DraftDocument } from "@/contracts/draft";
import { bringBack, readJournal, tearOut, writeJournal, type JournalPage, type Store } from "./journal";

function memory(): Store & { all: Map<string, string> } {
  const all = new Map<string, string>();
  return {
    all,
    get length() {
      return all.size;
    },
    key: (at) => [...all.keys()][at] ?? null,
    getItem: (key) => all.get(key) ?? null,
    setItem: (key, value) => void all.set(key, value),
    removeItem: (key) => void all.delete(key),
  };
}

const typed = (draft: DraftDocument, key: string, text: string): DraftDocument => ({
  ...draft,
  lines: { ...draft.lines, [key]: { typed: text, unit: null, si: null, source: null } },
});
const base = newDraft("t");
const page = (document: DraftDocument, more: Partial<JournalPage> = {}): JournalPage => ({
  baseVersion: 3,
  base,
  document,
  sent: [],
  at: "2026-12-01T10:00:00.000Z",
  ...more,
});
const s1 = { screeningId: "s1", rev: 2 };

describe("the journal", () => {
  it("gives back what each tab wrote, per draft and revision, oldest first", () => {
    const store = memory();
    const [late, early] = [page(typed(base, "1.03", "b"), { at: "2026-12-01T11:00:00.000Z" }), page(typed(base, "1.03", "a"))];
    expect(writeJournal(store, s1, "tab1", late)).toBe(true);
    expect(writeJournal(store, s1, "tab2", early)).toBe(true);
    expect(readJournal(store, s1)).toEqual([
      { ...early, tab: "tab2" },
      { ...late, tab: "tab1" },
    ]);
    expect(readJournal(store, { ...s1, rev: 3 })).toEqual([]);
    expect(readJournal(store, { ...s1, screeningId: "s" })).toEqual([]);
  });

  it("forgets what one tab tears out, and only that", () => {
    const store = memory();
    writeJournal(store, s1, "tab1", page(base));
    writeJournal(store, s1, "tab2", page(base));
    tearOut(store, s1, "tab1");
    expect(readJournal(store, s1).map(({ tab }) => tab)).toEqual(["tab2"]);
  });

  it("throws away a page that can't be read instead of failing on it", () => {
    const store = memory();
    store.setItem("ebbmark-journal/s1/2/tab1", '{"baseVersion":3,"document":{}}');
    store.setItem("ebbmark-journal/s1/2/tab2", "{");
    store.setItem("another", "{");
    expect(readJournal(store, s1)).toEqual([]);
    expect([...store.all.keys()]).toEqual(["another"]);
  });

  it("says when the browser has no room", () => {
    const full: Store = {
      ...memory(),
      setItem: () => {
        throw new DOMException("full", "QuotaExceededError");
      },
    };
    expect(writeJournal(full, s1, "tab1", page(base))).toBe(false);
  });
});

describe("what is brought back", () => {
  it("is every tab's lines, the later text where two typed in one line", () => {
    const both = [page(typed(typed(base, "1.03", "a"), "4.03", "20")), page(typed(base, "1.03", "b"))];
    const { merged, conflicts } = bringBack(both, base);
    expect(conflicts).toEqual([]);
    expect(merged.lines["1.03"]?.typed).toBe("b");
    expect(merged.lines["4.03"]?.typed).toBe("20");
  });

  it("leaves what others saved in other lines, and puts to choice what they saved in the same", () => {
    const server = typed(typed(base, "1.03", "theirs"), "2.09", "84");
    const { merged, conflicts } = bringBack([page(typed(typed(base, "1.03", "mine"), "4.03", "20"))], server);
    expect(conflicts).toEqual(["1.03"]);
    expect(merged.lines["1.03"]?.typed).toBe("mine");
    expect(merged.lines["2.09"]?.typed).toBe("84");
    expect(merged.lines["4.03"]?.typed).toBe("20");
  });

  it("knows its own words that arrived without an answer", () => {
    const sent = typed(base, "1.03", "bet");
    const { merged, conflicts } = bringBack([page(typed(base, "1.03", "between"), { sent: [sent] })], sent);
    expect(conflicts).toEqual([]);
    expect(merged.lines["1.03"]?.typed).toBe("between");
  });

  it("is nothing where the server has it by now", () => {
    const saved = typed(base, "1.03", "a");
    expect(bringBack([page(saved)], saved)).toEqual({ merged: saved, conflicts: [], taken: [] });
  });
});

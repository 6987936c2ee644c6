import { describe, expect, it } from "vitest";
import { newDraft } from "@/contracts/draft";
import { readJournal, tearOut, writeJournal } from "./journal";

function memory(): Pick<Storage, "getItem" | "setItem" | "removeItem"> & { all: Map<string, string> } {
  const all = new Map<string, string>();
  return {
    all,
    getItem: (key) => all.get(key) ?? null,
    setItem: (key, value) => void all.set(key, value),
    removeItem: (key) => void all.delete(key),
  };
}

const page = { baseVersion: 3, base: newDraft("a"), document: newDraft("b"), at: "2026-12-01T10:00:00.000Z" };

describe("the journal", () => {
  it("gives back what was written, per draft and revision", () => {
    const store = memory();
    expect(writeJournal(store, "s1", 2, page)).toBe(true);
    expect(readJournal(store, "s1", 2)).toEqual(page);
    expect(readJournal(store, "s1", 3)).toBeUndefined();
    expect(readJournal(store, "s2", 2)).toBeUndefined();
  });

  it("forgets what was torn out", () => {
    const store = memory();
    writeJournal(store, "s1", 2, page);
    tearOut(store, "s1", 2);
    expect(readJournal(store, "s1", 2)).toBeUndefined();
  });

  it("throws away a page that can't be read instead of failing on it", () => {
    const store = memory();
    store.setItem("ebbmark-journal/s1/2", '{"baseVersion":3,"document":{}}');
    expect(readJournal(store, "s1", 2)).toBeUndefined();
    expect(store.all.size).toBe(0);
  });

  it("says when the browser has no room", () => {
    const full = {
      ...memory(),
      setItem: () => {
        throw new DOMException("full", "QuotaExceededError");
      },
    };
    expect(writeJournal(full, "s1", 2, page)).toBe(false);
  });
});

import { act, renderHook } from "@testing-library/react";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { newDraft, type DraftDocument } from "@/contracts/draft";
import type { DraftView } from "@/contracts/views";
import { readJournal } from "./journal";
import { useKeeper } from "./use-keeper";

const of = { screeningId: "s1", rev: 1 };
const typed = (draft: DraftDocument, key: string, text: string): DraftDocument => ({
  ...draft,
  lines: { ...draft.lines, [key]: { typed: text, unit: null, si: null, source: null } },
});
const base = newDraft("t");
const view = (document: DraftDocument, version: number, updatedBy = "E-114"): DraftView => ({
  ...of,
  document,
  version,
  updatedAt: "2026-12-01T10:00:00.000Z",
  updatedBy,
  editable: true,
  answers: [],
});

/** A server that holds one draft, answers by version, and can be made to lose requests or answers. */
function draftServer() {
  const server = {
    held: view(base, 1),
    cut: "none" as "none" | "request" | "answer",
    puts: 0,
    fetch: async (_url: string, { body }: RequestInit) => {
      server.puts += 1;
      if (server.cut === "request") throw new TypeError("network");
      const { baseVersion, document } = JSON.parse(String(body)) as { baseVersion: number; document: DraftDocument };
      if (baseVersion !== server.held.version) {
        const problem = { type: "urn:ebbmark:draft-changed", title: "", status: 409, requestId: "r", current: server.held };
        return new Response(JSON.stringify(problem), { status: 409 });
      }
      server.held = view(document, baseVersion + 1);
      if (server.cut === "answer") throw new TypeError("network");
      return new Response(JSON.stringify(server.held), { status: 200 });
    },
  };
  return server;
}

let server = draftServer();

function keep() {
  return renderHook(
    ({ document }: { document: DraftDocument }) =>
      useKeeper(document, view(base, 1), "tab", (next) => hook.rerender({ document: next })),
    { initialProps: { document: base } },
  );
}
let hook: ReturnType<typeof keep>;

const type = (document: DraftDocument) => hook.rerender({ document });
const wait = (ms: number) => act(() => vi.advanceTimersByTimeAsync(ms));
const pages = () => readJournal(localStorage, of);

beforeEach(() => {
  vi.useFakeTimers();
  localStorage.clear();
  server = draftServer();
  vi.stubGlobal("fetch", (url: string, init: RequestInit) => server.fetch(url, init));
  hook = keep();
});
afterEach(() => {
  hook.unmount();
  vi.unstubAllGlobals();
  vi.useRealTimers();
});

describe("the keeper", () => {
  it("saves once after a rest, and tears its journal page out then", async () => {
    type(typed(base, "1.03", "a"));
    await wait(300);
    type(typed(base, "1.03", "ab"));
    expect(server.puts).toBe(0);
    expect(pages()).toHaveLength(1);
    await wait(700);
    expect(server.puts).toBe(1);
    expect(server.held.document.lines["1.03"]?.typed).toBe("ab");
    expect(hook.result.current.keeping.state).toBe("kept");
    expect(pages()).toEqual([]);
  });

  it("saves at once on leaving a line", async () => {
    type(typed(base, "1.03", "a"));
    window.dispatchEvent(new FocusEvent("focusout"));
    await wait(10);
    expect(server.held.document.lines["1.03"]?.typed).toBe("a");
  });

  it("forgets what was typed and taken back", async () => {
    type(typed(base, "1.03", "a"));
    type(base);
    await wait(1000);
    expect(server.puts).toBe(0);
    expect(pages()).toEqual([]);
  });

  it("says since when nothing is kept, tries again, and catches up", async () => {
    server.cut = "request";
    type(typed(base, "1.03", "a"));
    await wait(700);
    const { keeping } = hook.result.current;
    expect(keeping.state).toBe("not-kept");
    await wait(20_000);
    expect(server.puts).toBeGreaterThan(2);
    expect(hook.result.current.keeping).toEqual(keeping);
    expect(pages()[0]?.document.lines["1.03"]?.typed).toBe("a");
    server.cut = "none";
    await wait(31_000);
    expect(hook.result.current.keeping.state).toBe("kept");
    expect(hook.result.current.trouble).toBeNull();
    expect(pages()).toEqual([]);
  });

  it("takes over other lines of another save and keeps both", async () => {
    server.held = view(typed(base, "2.01-1", "V-1"), 2, "E-115");
    type(typed(base, "1.03", "a"));
    await wait(2000);
    expect(hook.result.current.conflict).toBeNull();
    expect(hook.result.current.taken).toEqual({ by: "E-115", lines: ["2.01-1"] });
    expect(server.held.document.lines["1.03"]?.typed).toBe("a");
    expect(server.held.document.lines["2.01-1"]?.typed).toBe("V-1");
  });

  it("never overwrites the same line of another save: it waits for the choice", async () => {
    server.held = view(typed(base, "1.03", "theirs"), 2, "E-115");
    type(typed(base, "1.03", "mine"));
    await wait(60_000);
    expect(server.held.document.lines["1.03"]?.typed).toBe("theirs");
    expect(hook.result.current.keeping.state).toBe("conflict");
    expect(hook.result.current.conflict?.merge.conflicts).toEqual(["1.03"]);
    // A crash now must not decide for the person: the page still tells mine from what it was typed on.
    expect(pages()[0]?.base.lines["1.03"]).toEqual(base.lines["1.03"]);
    act(() => hook.result.current.settle(typed(base, "1.03", "mine")));
    await wait(1000);
    expect(server.held.document.lines["1.03"]?.typed).toBe("mine");
    expect(hook.result.current.keeping.state).toBe("kept");
    expect(pages()).toEqual([]);
  });

  it("says that all is kept when the choice is for what the server holds", async () => {
    server.held = view(typed(base, "1.03", "theirs"), 2, "E-115");
    type(typed(base, "1.03", "mine"));
    await wait(700);
    expect(hook.result.current.keeping.state).toBe("conflict");
    const puts = server.puts;
    act(() => hook.result.current.settle(server.held.document));
    await wait(700);
    expect(hook.result.current.keeping.state).toBe("kept");
    expect(server.puts).toBe(puts);
  });

  it("knows its own save again when only the answer was lost", async () => {
    server.cut = "answer";
    type(typed(base, "1.03", "bet"));
    await wait(700);
    expect(hook.result.current.keeping.state).toBe("not-kept");
    server.cut = "none";
    type(typed(base, "1.03", "between"));
    await wait(5000);
    expect(hook.result.current.conflict).toBeNull();
    expect(server.held.document.lines["1.03"]?.typed).toBe("between");
    expect(hook.result.current.keeping.state).toBe("kept");
  });

  it("answers a flush with the version that holds everything", async () => {
    type(typed(base, "1.03", "a"));
    let version: number | null = null;
    await act(async () => {
      version = await hook.result.current.flush();
    });
    expect(version).toBe(2);
  });

  it("adopts lines of a tab that is gone, and lets go of them only once they are safe", async () => {
    const written = vi.fn(() => expect(pages()).toHaveLength(1));
    act(() => hook.result.current.adopt({ merged: typed(base, "1.03", "old tab"), conflicts: [], taken: [] }, written));
    expect(written).toHaveBeenCalledOnce();
    await wait(1000);
    expect(server.held.document.lines["1.03"]?.typed).toBe("old tab");
  });
});

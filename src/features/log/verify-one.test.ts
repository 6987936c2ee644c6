import { afterEach, describe, expect, it, vi } from "vitest";
import type { VerificationRow } from "@/contracts/views";
import { madeLog } from "../../../tests/fixtures/made-log";
import { verifyOne } from "./verify-log";

afterEach(() => vi.unstubAllGlobals());

const serve = (rows: VerificationRow[]) =>
  vi.stubGlobal("fetch", async (address: string) => {
    const query = new URL(address, "http://x.invalid").searchParams;
    const from = Number(query.get("from"));
    return Response.json({ ...madeLog(), rows: rows.filter(({ seq }) => seq >= from).slice(0, Number(query.get("limit"))) });
  });

describe("the check of one entry", () => {
  it.each([1, 2, 3])("finds that entry %d holds", async (seq) => {
    serve(madeLog().rows);
    expect(await verifyOne(seq)).toMatchObject({ seq, holds: true, faults: [], first: seq === 1 });
  });

  it("finds a body that was exchanged", async () => {
    const { rows } = madeLog();
    rows[2] = { ...rows[2]!, body: { saltHex: "3".repeat(64), text: "{}" } };
    serve(rows);
    expect((await verifyOne(3)).faults).toEqual(["The body is not the one the envelope commits to."]);
  });

  it("finds that the entry before was altered, even where its stored seal was altered with it", async () => {
    const { rows } = madeLog();
    const bent = rows[1]!.envelope.replace("test-entry-2", "test-entry-9");
    rows[1] = { ...rows[1]!, envelope: bent, hash: "0".repeat(64) };
    serve(rows);
    expect((await verifyOne(3)).faults).toEqual(["The link to entry 2 is broken."]);
  });

  it("finds a gap and an entry that is not there", async () => {
    serve(madeLog().rows.filter(({ seq }) => seq !== 2));
    expect(await verifyOne(3)).toMatchObject({ holds: false, faults: ["Entry 2 is missing."] });
    expect(await verifyOne(9)).toMatchObject({ holds: false, faults: ["The server has no entry 9."] });
  });
});

import { render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, describe, expect, it, vi } from "vitest";
import type { VerificationRow } from "@/contracts/views";
import { madeLog } from "../../../tests/fixtures/made-log";
import { EntryList } from "./entry-list";
import { VerificationProvider } from "./verification";
import { VerifyPanel } from "./verify-panel";

vi.mock("next/link", () => ({
  default: ({ children, href }: { children: React.ReactNode; href: string }) => <a href={href}>{children}</a>,
}));
afterEach(() => vi.unstubAllGlobals());

/** Serves a log the way the server does, a run at a time. */
function serve(
  rows: VerificationRow[],
  options: { origin?: string; head?: { seq: number; hash: string }; wait?: Promise<void> } = {},
) {
  const { origin, head } = madeLog();
  vi.stubGlobal("fetch", async (address: string, { signal }: RequestInit) => {
    const query = new URL(address, "http://x.invalid").searchParams;
    if (Number(query.get("from")) > 1) await options.wait;
    if (signal?.aborted) throw new DOMException("aborted", "AbortError");
    const from = Number(query.get("from"));
    const page = rows.filter(({ seq }) => seq >= from).slice(0, Number(query.get("limit")));
    return Response.json({ origin: options.origin ?? origin, head: options.head ?? head, rows: page });
  });
}

function draw() {
  const { rows } = madeLog();
  const listed = rows.map(({ seq, hash, mirrors }) => ({
    seq,
    at: mirrors.at,
    kind: mirrors.kind,
    subject: mirrors.subject,
    by: "server",
    record: null,
    rev: null,
    what: "Something",
    hash,
    href: `/log?entry=${seq}`,
  }));
  return render(
    <VerificationProvider>
      <VerifyPanel size={rows.length} />
      <EntryList rows={listed} chosen={null} now="2026-12-01T00:00:00Z" />
    </VerificationProvider>,
  );
}
const press = () => userEvent.click(screen.getByRole("button", { name: /^Verify/ }));

describe("the check of the whole log", () => {
  it("says nothing of any entry before somebody looks", () => {
    draw();
    expect(screen.getAllByText("Not checked")).toHaveLength(madeLog().rows.length);
  });

  it("recomputes every seal and says that they hold", async () => {
    serve(madeLog().rows);
    draw();
    await press();
    expect(await screen.findByText(/^Every seal holds to entry 3, recomputed in your browser at \d\d:\d\d:\d\d$/)).toBeVisible();
    expect(screen.getAllByText("Seal holds")).toHaveLength(3);
  });

  it("finds one changed character, names the entry and the link behind it", async () => {
    const rows = madeLog().rows;
    rows[1] = { ...rows[1]!, envelope: rows[1]!.envelope.replace("system", "sysrem") };
    serve(rows);
    draw();
    await press();
    expect(await screen.findByRole("heading", { name: "The seal of entry 2 does not hold" })).toBeVisible();
    expect(screen.getByText(/^Entry 2: .*The envelope does not hash to the stored hash\./)).toBeVisible();
    expect(screen.getByText(/^Entry 3: .*The link to entry 2 is broken\./)).toBeVisible();
    expect(screen.getAllByText("Seal broken")).toHaveLength(2);
    expect(screen.getByRole("link", { name: "Open entry 2" })).toHaveAttribute("href", "/log?entry=2");
  });

  it("finds an end that was cut off", async () => {
    const { rows, head } = madeLog();
    serve(rows.slice(0, 2), { head });
    draw();
    await press();
    expect(
      await screen.findByText("The ledger ends at entry 2; entry 3 is known from elsewhere, so its end was cut off."),
    ).toBeVisible();
  });

  it("does not take a body it may not see for a checked one", async () => {
    serve(madeLog().rows.map((row) => (row.seq === 2 ? { ...row, body: "withheld" as const } : row)));
    draw();
    await press();
    expect(await screen.findByText(/^1 body is not open to your role/)).toBeVisible();
  });

  it("says that the check did not end when the connection is lost", async () => {
    vi.stubGlobal("fetch", async () => {
      throw new TypeError("network");
    });
    draw();
    await press();
    expect(await screen.findByText("The check did not come to an end.")).toBeVisible();
    expect(screen.getAllByText("Not checked")).toHaveLength(3);
  });

  it("can be cancelled, keeps what it found, and says nothing of the rest", async () => {
    let release = () => {};
    serve(madeLog().rows, { wait: new Promise((resolve) => (release = resolve)) });
    draw();
    await press();
    await userEvent.click(await screen.findByRole("button", { name: "Cancel" }));
    release();
    expect(await screen.findByText(/^Cancelled\. 3 entries were checked/)).toBeVisible();
  });
});

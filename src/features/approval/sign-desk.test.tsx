import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { endpoints } from "@/contracts/paths";
import { meanings } from "@/ledger/statements";
import { madeScreening } from "../../../tests/fixtures/screening-view";
import { SignDesk, type Blocker } from "./sign-desk";

vi.mock("next/link", () => ({
  default: ({ children, href }: { children: React.ReactNode; href: string }) => <a href={href}>{children}</a>,
}));

const screening = madeScreening();
const prepared = screening.prepared!;
const ceremony = {
  nonce: "n".repeat(22),
  idempotencyKey: "k".repeat(22),
  expiresAt: "",
  shownSha256: prepared.contentSha256,
  meaning: "",
  method: "",
};
const receipt = { seq: 13, at: "2026-12-01T12:00:00.000Z", hash: "f".repeat(64), contentSha256: prepared.contentSha256 };
let sent: { address: string; body: Record<string, unknown> }[] = [];

beforeEach(() => {
  sent = [];
  vi.stubGlobal("fetch", async (address: string, options: RequestInit) => {
    sent.push({ address, body: JSON.parse(String(options.body)) as Record<string, unknown> });
    return Response.json(address === endpoints.ceremony(screening.id) ? ceremony : receipt);
  });
});
afterEach(() => vi.unstubAllGlobals());

function draw(blockers: Blocker[] = []) {
  return render(
    <QueryClientProvider client={new QueryClient()}>
      <SignDesk
        screeningId={screening.id}
        prepared={prepared}
        blockers={blockers}
        viewer={{ badge: "E-114", printedName: "Test engineer", role: "engineer" }}
        method="Password again"
      >
        limits
      </SignDesk>
    </QueryClientProvider>,
  );
}
const tickAll = async () => {
  for (const box of screen.getAllByRole("checkbox")) await userEvent.click(box);
};

describe("review and sign", () => {
  it("shows what the signature means before it is given", () => {
    draw();
    expect(screen.getByText(meanings.sign)).toBeVisible();
    expect(screen.getByText("SC-0041 rev 2")).toBeVisible();
  });

  it("waits for every caution, one by one, then for the password", async () => {
    draw();
    const button = () => screen.getByRole("button", { name: "Sign and hand over" });
    expect(button()).toHaveAccessibleDescription("Three acknowledgements are missing: C1, C2 and C6.");
    await userEvent.click(screen.getByRole("checkbox", { name: /^C2/ }));
    expect(button()).toHaveAccessibleDescription("Two acknowledgements are missing: C1 and C6.");
    await userEvent.click(screen.getByRole("checkbox", { name: /^C1/ }));
    await userEvent.click(screen.getByRole("checkbox", { name: /^C6/ }));
    expect(button()).toHaveAccessibleDescription("Type your password.");
    await userEvent.click(button());
    expect(sent).toEqual([]);
  });

  it("can't be done while a line has no source, and leads to that line", async () => {
    draw([{ path: "4.03", message: "Wall thickness has no source." }]);
    await tickAll();
    await userEvent.type(screen.getByLabelText("Password, once more"), "correct horse battery");
    expect(screen.getByRole("button", { name: "Sign and hand over" })).toHaveAccessibleDescription(
      "One line has no source: 4.03.",
    );
    expect(screen.getByRole("link", { name: "4.03" })).toHaveAttribute(
      "href",
      `/screenings/${screening.id}/form/steel#line-4.03`,
    );
    await userEvent.click(screen.getByRole("button", { name: "Sign and hand over" }));
    expect(sent).toEqual([]);
  });

  it("signs the content shown and gives entry, time and seal", async () => {
    draw();
    await tickAll();
    await userEvent.type(screen.getByLabelText("Password, once more"), "correct horse battery");
    await userEvent.click(screen.getByRole("button", { name: "Sign and hand over" }));
    expect(await screen.findByText("Signed and handed over")).toBeVisible();
    expect(screen.getByText("2026-12-01 12:00:00.000 UTC")).toBeVisible();
    expect(screen.getByRole("link", { name: "Entry 13" })).toHaveAttribute("href", "/log?entry=13");
    expect(sent[1]).toMatchObject({
      address: endpoints.sign(screening.id),
      body: { rev: 2, shownSha256: prepared.contentSha256, acknowledged: ["C1", "C2", "C6"], password: "correct horse battery" },
    });
    expect(screen.queryByLabelText("Password, once more")).toBeNull();
  });
});

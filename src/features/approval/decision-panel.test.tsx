import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { render, screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { endpoints } from "@/contracts/paths";
import { madeScreening } from "../../../tests/fixtures/screening-view";
import { DecisionPanel } from "./decision-panel";

vi.mock("next/link", () => ({
  default: ({ children, href }: { children: React.ReactNode; href: string }) => <a href={href}>{children}</a>,
}));

const screening = madeScreening();
const prepared = screening.prepared!;
const all = new Set(prepared.content.cautions.map(({ id }) => id));
const ceremony = {
  nonce: "n".repeat(22),
  idempotencyKey: "k".repeat(22),
  expiresAt: "2026-12-01T12:00:00Z",
  shownSha256: prepared.contentSha256,
  meaning: "",
  method: "password",
};
const receipt = { seq: 13, at: "2026-12-01T12:00:00.000Z", hash: "f".repeat(64), contentSha256: prepared.contentSha256 };

type Sent = { address: string; body: Record<string, unknown> };
let sent: Sent[] = [];
let answers: (Response | Error)[] = [];
const ok = (body: unknown) => Response.json(body);
const refuse = (code: string, status: number) =>
  Response.json({ type: `urn:ebbmark:${code}`, title: "No.", status, requestId: "r" }, { status });

beforeEach(() => {
  sent = [];
  answers = [];
  vi.stubGlobal("fetch", async (address: string, options: RequestInit) => {
    sent.push({ address, body: JSON.parse(String(options.body)) as Record<string, unknown> });
    const answer = answers.shift();
    if (!answer || answer instanceof Error) throw answer ?? new TypeError("no answer prepared");
    return answer;
  });
});
afterEach(() => vi.unstubAllGlobals());

function draw(acknowledged: ReadonlySet<string> = all) {
  const client = new QueryClient({ defaultOptions: { mutations: { retry: false, networkMode: "always" } } });
  return render(
    <QueryClientProvider client={client}>
      <DecisionPanel
        screeningId={screening.id}
        prepared={prepared}
        author="E-114"
        acknowledged={acknowledged}
        viewer={{ badge: "A-027", printedName: "Test approver", role: "approver" }}
        method="Password again"
        onDone={() => undefined}
      />
    </QueryClientProvider>,
  );
}

const choose = (name: string) => userEvent.click(screen.getByRole("radio", { name }));
const password = () => screen.getByLabelText("Password, once more");

describe("the decision panel", () => {
  it("says which cautions are missing and sends nothing", async () => {
    draw(new Set(["C1"]));
    await choose("Countersign");
    await userEvent.type(password(), "correct horse battery");
    const button = screen.getByRole("button", {
      name: "Countersign",
      description: "Two acknowledgements are missing: C2 and C6.",
    });
    await userEvent.click(button);
    expect(sent).toEqual([]);
  });

  it("countersigns what was shown, with the password, and shows the receipt", async () => {
    draw();
    answers = [ok(ceremony), ok(receipt)];
    await choose("Countersign");
    await userEvent.type(password(), "correct horse battery");
    await userEvent.click(screen.getByRole("button", { name: "Countersign" }));
    const shown = await screen.findByRole("status", { name: "Receipt" });
    expect(within(shown).getByText("Countersigned")).toBeVisible();
    expect(within(shown).getByText("13")).toBeVisible();
    expect(sent.map(({ address }) => address)).toEqual([endpoints.ceremony(screening.id), endpoints.countersign(screening.id)]);
    expect(sent[0]?.body).toEqual({ act: "countersign", rev: 2 });
    expect(sent[1]?.body).toMatchObject({
      rev: 2,
      nonce: ceremony.nonce,
      idempotencyKey: ceremony.idempotencyKey,
      shownSha256: prepared.contentSha256,
      acknowledged: ["C1", "C2", "C6"],
      conditions: [],
      password: "correct horse battery",
    });
  });

  it("keeps the remarks when the password is wrong, and asks for it again", async () => {
    draw(new Set());
    answers = [ok(ceremony), refuse("wrong-credentials", 401)];
    await choose("Return with remarks");
    await userEvent.type(screen.getByLabelText("Line of remark 1"), "7.02");
    await userEvent.type(screen.getByLabelText("Words of remark 1"), "Which nameplate?");
    await userEvent.type(password(), "wrong password here");
    await userEvent.click(screen.getByRole("button", { name: "Return to E-114" }));
    expect(await screen.findByText("The password is not right. Nothing else you entered is lost.")).toBeVisible();
    expect(screen.getByLabelText("Words of remark 1")).toHaveValue("Which nameplate?");
    expect(password()).toHaveValue("");
    expect(sent[1]?.body.remarks).toEqual([{ line: "A7.02", text: "Which nameplate?" }]);
  });

  it("sends the very same act again after a lost answer", async () => {
    draw();
    answers = [ok(ceremony), new TypeError("network"), ok(receipt)];
    await choose("Countersign");
    await userEvent.type(password(), "correct horse battery");
    await userEvent.click(screen.getByRole("button", { name: "Countersign" }));
    expect(await screen.findByText("No answer came.")).toBeVisible();
    expect(screen.getByRole("radio", { name: "Return with remarks" })).toBeDisabled();
    await userEvent.click(screen.getByRole("button", { name: "Send again" }));
    await screen.findByRole("status", { name: "Receipt" });
    expect(sent).toHaveLength(3);
    expect(sent[2]).toEqual(sent[1]);
  });

  it("opens a signing page anew when the first one expired", async () => {
    draw();
    const later = { ...ceremony, nonce: "m".repeat(22), idempotencyKey: "j".repeat(22) };
    answers = [ok(ceremony), refuse("ceremony-expired", 410), ok(later), ok(receipt)];
    await choose("Countersign");
    await userEvent.type(password(), "correct horse battery");
    await userEvent.click(screen.getByRole("button", { name: "Countersign" }));
    await screen.findByRole("status", { name: "Receipt" });
    expect(sent[3]?.body).toMatchObject({ nonce: later.nonce, idempotencyKey: later.idempotencyKey });
  });

  it("sends the conditions that were written, and waits for the words of one that is empty", async () => {
    draw();
    answers = [ok(ceremony), ok(receipt)];
    await choose("Countersign");
    await userEvent.type(password(), "correct horse battery");
    await userEvent.click(screen.getByRole("button", { name: "Add a condition" }));
    expect(screen.getByRole("button", { name: "Countersign" })).toHaveAccessibleDescription(
      "A condition has no words. Write it, or remove it.",
    );
    await userEvent.type(screen.getByLabelText("Condition 1"), "Measure the wall.");
    await userEvent.click(screen.getByRole("button", { name: "Countersign" }));
    await screen.findByRole("status", { name: "Receipt" });
    expect(sent[1]?.body.conditions).toEqual(["Measure the wall."]);
  });

  it("refuses a remark on a line that the record has not", async () => {
    draw();
    await choose("Return with remarks");
    await userEvent.type(screen.getByLabelText("Line of remark 1"), "9.99");
    expect(screen.getByText("There is no line 9.99.")).toBeVisible();
    expect(
      screen.getByRole("button", { name: "Return to E-114", description: "There is no line 9.99 in this record." }),
    ).toBeVisible();
  });

  it("leads to the record as it is now when it changed underneath", async () => {
    draw();
    answers = [ok(ceremony), refuse("already-decided", 409)];
    await choose("Countersign");
    await userEvent.type(password(), "correct horse battery");
    await userEvent.click(screen.getByRole("button", { name: "Countersign" }));
    expect(await screen.findByRole("link", { name: "Read the record as it is now" })).toHaveAttribute(
      "href",
      `/screenings/${screening.id}`,
    );
  });
});

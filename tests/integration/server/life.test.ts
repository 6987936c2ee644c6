import { afterAll, beforeAll, describe, expect, it } from "vitest";
import * as ceremony from "@/app/api/v1/screenings/[screeningId]/ceremony/route";
import * as compute from "@/app/api/v1/screenings/[screeningId]/compute/route";
import * as countersign from "@/app/api/v1/screenings/[screeningId]/countersign/route";
import * as draft from "@/app/api/v1/screenings/[screeningId]/draft/route";
import * as giveBack from "@/app/api/v1/screenings/[screeningId]/return/route";
import * as revisions from "@/app/api/v1/screenings/[screeningId]/revisions/route";
import * as screening from "@/app/api/v1/screenings/[screeningId]/route";
import * as sign from "@/app/api/v1/screenings/[screeningId]/sign/route";
import * as withdraw from "@/app/api/v1/screenings/[screeningId]/withdraw/route";
import * as log from "@/app/api/v1/log/route";
import * as entry from "@/app/api/v1/log/[seq]/route";
import * as verification from "@/app/api/v1/log/verification/route";
import type {
  CeremonyView,
  DraftView,
  EntryRow,
  EntryView,
  Page,
  PreparedView,
  ReceiptView,
  ScreeningView,
  VerificationView,
} from "@/contracts/views";
import type { DraftDocument } from "@/contracts/draft";
import { createVerification } from "@/ledger/verify-ledger";
import { contentHash } from "@/ledger/body";
import { canonicalJson } from "@/ledger/canonical-json";
import type { Handler } from "@/server/door";
import { nitrogenBottleBank } from "@db/seed/nitrogen-bottle-bank";
import {
  call,
  type Called,
  closeGround,
  codeOf,
  firstAdministrator,
  got,
  join,
  makeFacility,
  makeScreening,
  makeSection,
  openGround,
  passwordOf,
} from "./ground";

type Person = { cookie: string; id: string };
let administrator: string;
let engineer: Person;
let colleague: Person;
let approver: Person;
let auditor: Person;
let sectionId: string;

beforeAll(async () => {
  await openGround();
  administrator = await firstAdministrator();
  const { id: facilityId } = await makeFacility(administrator, "TF");
  const facilityIds = [facilityId];
  engineer = await join(administrator, { badge: "E-114", role: "engineer", facilityIds });
  colleague = await join(administrator, { badge: "E-115", role: "engineer", facilityIds });
  approver = await join(administrator, { badge: "A-027", role: "approver", facilityIds });
  auditor = await join(administrator, { badge: "U-009", role: "auditor", facilityIds: [] });
  sectionId = (await makeSection(engineer.cookie, facilityId)).id;
});
afterAll(closeGround);

const at = (screeningId: string) => ({ params: { screeningId } });
const read = async (who: Person, id: string, query = ""): Promise<ScreeningView> =>
  got(await call(screening.GET, { cookie: who.cookie, query, ...at(id) }));
const readDraft = async (who: Person, id: string): Promise<DraftView> =>
  got(await call(draft.GET, { cookie: who.cookie, ...at(id) }));
const save = (who: Person, id: string, baseVersion: number, document: DraftDocument): Promise<Called> =>
  call(draft.PUT, { method: "PUT", cookie: who.cookie, body: { baseVersion, document }, ...at(id) });
const run = (who: Person, id: string, draftVersion: number): Promise<Called> =>
  call(compute.POST, { cookie: who.cookie, body: { draftVersion }, ...at(id) });
const open = (who: Person, id: string, act: string, rev = 1): Promise<Called> =>
  call(ceremony.POST, { cookie: who.cookie, body: { act, rev }, ...at(id) });

const handlers: Record<string, Handler> = {
  sign: sign.POST,
  countersign: countersign.POST,
  return: giveBack.POST,
  withdraw: withdraw.POST,
};

/** A whole act: open page, then the request; `change` spoils or completes the body. */
async function act(
  who: Person,
  badge: string,
  id: string,
  name: string,
  { rev = 1, change = {} }: { rev?: number; change?: object } = {},
): Promise<Called> {
  const opened = await open(who, id, name, rev);
  if (opened.status >= 400) return opened;
  return send(who, id, name, await bodyFor(who, badge, id, name, rev, got<CeremonyView>(opened), change));
}

const send = (who: Person, id: string, name: string, body: object): Promise<Called> =>
  call(handlers[name] as Handler, { cookie: who.cookie, body, ...at(id) });

async function bodyFor(who: Person, badge: string, id: string, name: string, rev: number, page: CeremonyView, change: object) {
  const cautions = (await read(who, id, `?rev=${rev}`)).prepared?.content.cautions.map((one) => one.id) ?? [];
  const { nonce, idempotencyKey, shownSha256 } = page;
  const extra = {
    sign: { acknowledged: cautions },
    countersign: { acknowledged: cautions, conditions: [] },
    return: { remarks: [{ line: "A6.08", text: "Say where the film coefficient comes from." }] },
    withdraw: { reason: "The bottles are replaced." },
  }[name];
  return { rev, nonce, idempotencyKey, shownSha256, password: passwordOf(badge), ...extra, ...change };
}

async function computed(who = engineer): Promise<string> {
  const { id } = await makeScreening(who.cookie, sectionId);
  got(await save(who, id, 1, nitrogenBottleBank()));
  got(await run(who, id, 2));
  return id;
}

describe("a draft", () => {
  it("is kept as typed, with SI values of the server's own", async () => {
    const { id, record } = await makeScreening(engineer.cookie, sectionId);
    expect(record).toMatch(/^SC-\d{4}$/);
    const document = nitrogenBottleBank();
    document.lines["2.09"] = { typed: "200", unit: "bar(g)", si: 12345, source: null };
    const saved = got<DraftView>(await save(engineer, id, 1, document));
    expect(saved).toMatchObject({ version: 2, updatedBy: "E-114", editable: true });
    expect(saved.document.lines["2.09"]).toEqual({ typed: "200", unit: "bar(g)", si: 20101325, source: null });
    expect((await read(engineer, id)).title).toBe("Nitrogen bottle bank, cold blowdown");
    expect((await read(engineer, id)).state).toBe("draft");
  });

  it("is never overwritten by a save that did not see the other", async () => {
    const { id } = await makeScreening(engineer.cookie, sectionId);
    const mine = nitrogenBottleBank();
    const theirs = nitrogenBottleBank();
    theirs.lines["A5.02"] = { typed: "8", unit: "mm", si: null, source: { kind: "sheet", note: "PID rev D" } };
    got(await save(colleague, id, 1, theirs));
    const late = await save(engineer, id, 1, mine);
    expect([late.status, codeOf(late)]).toEqual([409, "draft-changed"]);
    const problem = late.body as { detail: string; problems: { path: string; message: string }[]; current: DraftView };
    expect(problem.problems).toEqual([{ path: "A5.02", message: expect.stringMatching(/^Yours: 6 mm.*Saved: 8 mm/) as string }]);
    expect(problem.detail).toContain("E-115");
    expect(problem.current.version).toBe(2);
    expect((await readDraft(engineer, id)).document.lines["A5.02"]?.typed).toBe("8");
    got(await save(engineer, id, 2, mine));
  });

  it("keeps what is no number, refuses an unknown line by name", async () => {
    const { id } = await makeScreening(engineer.cookie, sectionId);
    const document = nitrogenBottleBank();
    document.lines["2.09"] = { typed: "about 200", unit: "bar(g)", si: null, source: null };
    expect(got<DraftView>(await save(engineer, id, 1, document)).document.lines["2.09"]).toMatchObject({
      typed: "about 200",
      si: null,
    });
    const wrong = await save(engineer, id, 2, {
      ...document,
      lines: { "9.99": { typed: "", unit: null, si: null, source: null } },
    });
    expect([wrong.status, (wrong.body as { problems: { path: string }[] }).problems[0]?.path]).toEqual([
      422,
      "document.lines.9.99",
    ]);
  });
});

describe("computing in full", () => {
  it("names every line in the way", async () => {
    const { id } = await makeScreening(engineer.cookie, sectionId);
    const document = nitrogenBottleBank();
    delete document.lines["A5.02"];
    document.lines["2.10"] = { typed: "warm", unit: "°C", si: null, source: null };
    got(await save(engineer, id, 1, document));
    const refused = await run(engineer, id, 2);
    expect([refused.status, codeOf(refused)]).toEqual([422, "invalid-request"]);
    expect((refused.body as { problems: { path: string }[] }).problems.map(({ path }) => path).sort()).toEqual(["2.10", "A5.02"]);
    expect((await read(engineer, id)).prepared).toBeNull();
  });

  it("stores what a signature will name: bytes under their own hashes, cautions with them", async () => {
    const id = await computed();
    const { prepared, state, verdict, sentence, ebb, may } = await read(engineer, id);
    expect(state).toBe("computed");
    expect(verdict).toBe("within");
    expect(sentence).toMatch(/^The wall stays \d+\.\d\u00a0K above its minimum design metal temperature\.$/);
    expect(ebb?.y[0]).toBe(1);
    expect(ebb?.y.at(-1)).toBeLessThan(0.02);
    expect(may).toMatchObject({ edit: true, compute: true, sign: true, decide: false });
    const content = (prepared as PreparedView).content;
    expect(contentHash(canonicalJson(content))).toBe(prepared?.contentSha256);
    expect(content.cautions.map(({ id: caution }) => caution)).toEqual(expect.arrayContaining(["C1", "C2", "C6"]));
    expect(content.assumed).toContain("A6.08");
    expect(content.lines.find(({ line }) => line === "A7.01")).toMatchObject({
      typed: "15",
      unit: "min",
      si: 900,
      source: { note: "limit policy LP-1 rev 1" },
    });
    expect(content.cases[0]?.confirmation.find(({ id: figure }) => figure === "minimumWallTemperatureK")?.change).toBeLessThan(
      0.01,
    );
    const [first] = (prepared as PreparedView).runs;
    expect(first?.result.caseSha256).toBe(content.cases[0]?.caseSha256);
    expect(contentHash(canonicalJson(JSON.parse(JSON.stringify(first?.document))))).toBe(content.cases[0]?.caseSha256);
    expect(first?.result.summary.minimumFluidTemperatureK).toBeLessThan(288);
  });

  it("gives the same bytes for the same draft", async () => {
    const id = await computed();
    const first = (await read(engineer, id)).prepared?.contentSha256;
    expect(got<PreparedView>(await run(engineer, id, 2)).contentSha256).toBe(first);
  });

  it("refuses a version that is no longer the newest, and goes stale with the next save", async () => {
    const id = await computed();
    got(await save(engineer, id, 2, nitrogenBottleBank()));
    expect(codeOf(await run(engineer, id, 2))).toBe("draft-changed");
    expect(await read(engineer, id)).toMatchObject({ state: "draft", prepared: { stale: true }, may: { sign: false } });
    expect(codeOf(await open(engineer, id, "sign"))).toBe("not-computed");
  });

  it("passes on the engine's reason when the case can't be computed", async () => {
    const { id } = await makeScreening(engineer.cookie, sectionId);
    const document = nitrogenBottleBank();
    document.lines["2.10"] = { typed: "-190", unit: "°C", si: null, source: { kind: "sheet", note: "x" } };
    document.lines["2.09"] = { typed: "1", unit: "bar(g)", si: null, source: { kind: "sheet", note: "x" } };
    document.lines["A7.09"] = { typed: "0.5", unit: "bar(g)", si: null, source: { kind: "sheet", note: "x" } };
    document.composition.rows = [{ id: "carbon_dioxide", typed: "100", molePercent: null }];
    got(await save(engineer, id, 1, document));
    const refused = await run(engineer, id, 2);
    expect([refused.status, codeOf(refused)]).toEqual([422, "cannot-compute"]);
    expect((refused.body as { detail: string }).detail.length).toBeGreaterThan(20);
  });
});

describe("signing", () => {
  it("needs every caution, a source for every value, and the password; a wrong one keeps the page open", async () => {
    const id = await computed();
    const page = got<CeremonyView>(await open(engineer, id, "sign"));
    expect(page.meaning).toContain("I prepared this screening");
    const whole = await bodyFor(engineer, "E-114", id, "sign", 1, page, {});
    expect(codeOf(await send(engineer, id, "sign", { ...whole, password: "not the password" }))).toBe("wrong-credentials");
    expect(codeOf(await send(engineer, id, "sign", { ...whole, acknowledged: ["C1"] }))).toBe("invalid-request");
    expect(codeOf(await send(engineer, id, "sign", { ...whole, shownSha256: "0".repeat(64) }))).toBe("content-changed");
    const receipt = got<ReceiptView>(await send(engineer, id, "sign", whole));
    expect(receipt.hash).toMatch(/^[0-9a-f]{64}$/);
  });

  it("is refused while a value has no source, with the lines named", async () => {
    const { id } = await makeScreening(engineer.cookie, sectionId);
    const document = nitrogenBottleBank();
    document.lines["A5.02"] = { typed: "6", unit: "mm", si: null, source: null };
    document.composition.source = null;
    got(await save(engineer, id, 1, document));
    got(await run(engineer, id, 2));
    const refused = await act(engineer, "E-114", id, "sign");
    expect([refused.status, codeOf(refused)]).toEqual([422, "invalid-request"]);
    expect((refused.body as { problems: { path: string }[] }).problems.map(({ path }) => path)).toEqual(["A5.02", "3.01"]);
  });

  it("gives the first receipt to a repeat, also to many at once", async () => {
    const id = await computed();
    const page = got<CeremonyView>(await open(engineer, id, "sign"));
    const body = await bodyFor(engineer, "E-114", id, "sign", 1, page, {});
    const [first, ...together] = await Promise.all(Array.from({ length: 4 }, () => send(engineer, id, "sign", body)));
    const receipt = got<ReceiptView>(first as Called);
    const later = await Promise.all(Array.from({ length: 10 }, () => send(engineer, id, "sign", body)));
    expect([...together, ...later].map((answer) => got<ReceiptView>(answer))).toEqual(Array<ReceiptView>(13).fill(receipt));
    expect(codeOf(await send(engineer, id, "sign", { ...body, idempotencyKey: `${body.idempotencyKey.slice(0, -1)}_` }))).toBe(
      "ceremony-expired",
    );
    expect(
      got<Page<EntryRow>>(await call(log.GET, { cookie: auditor.cookie, query: `?record=${(await read(engineer, id)).record}` }))
        .total,
    ).toBe(1);
  });

  it("names what was shown: a run made after the page was opened is other content", async () => {
    const id = await computed();
    const page = got<CeremonyView>(await open(engineer, id, "sign"));
    const body = await bodyFor(engineer, "E-114", id, "sign", 1, page, {});
    const document = nitrogenBottleBank();
    document.lines["A5.02"] = { typed: "7", unit: "mm", si: null, source: { kind: "sheet", note: "PID rev D" } };
    got(await save(engineer, id, 2, document));
    got(await run(engineer, id, 3));
    expect(codeOf(await send(engineer, id, "sign", body))).toBe("content-changed");
  });

  it("takes only a page of one's own, in one's own session, for this act and record", async () => {
    const id = await computed();
    const other = await computed(colleague);
    const page = got<CeremonyView>(await open(colleague, other, "sign"));
    const body = await bodyFor(engineer, "E-114", id, "sign", 1, page, {});
    expect(codeOf(await send(engineer, id, "sign", body))).toBe("ceremony-expired");
    expect(codeOf(await send(engineer, id, "sign", { ...body, nonce: "0123456789abcdef0123" }))).toBe("ceremony-expired");
  });

  it("is for those who worked on it", async () => {
    const id = await computed();
    expect(codeOf(await open(colleague, id, "sign"))).toBe("not-allowed");
    expect(codeOf(await open(approver, id, "sign"))).toBe("not-allowed");
  });
});

describe("the whole life of a screening", () => {
  it("goes from draft to returned, to revision 2, to countersigned, and the log shows and proves it", async () => {
    const id = await computed();
    got(await act(engineer, "E-114", id, "sign"));
    expect(await read(engineer, id)).toMatchObject({
      state: "signed",
      may: { edit: false, sign: false, withdraw: true },
      draft: { editable: false },
    });
    expect(codeOf(await save(engineer, id, 2, nitrogenBottleBank()))).toBe("wrong-state");

    // Nobody decides on their own work: not the author by her role, and not by another road.
    expect(codeOf(await open(engineer, id, "countersign"))).toBe("not-allowed");
    expect((await read(approver, id)).may).toMatchObject({ decide: true, withdraw: false });

    const noRemarks = await act(approver, "A-027", id, "return", { change: { remarks: [] } });
    expect(codeOf(noRemarks)).toBe("invalid-request");
    const noLine = await act(approver, "A-027", id, "return", { change: { remarks: [{ line: "9.99", text: "?" }] } });
    expect((noLine.body as { problems: { path: string }[] }).problems[0]?.path).toBe("remarks[0].line");
    got(await act(approver, "A-027", id, "return"));
    expect(await read(engineer, id)).toMatchObject({ state: "returned", may: { revise: true, edit: false } });
    expect(codeOf(await act(approver, "A-027", id, "countersign"))).toBe("already-decided");

    const next = got<{ rev: number }>(
      await call(revisions.POST, {
        cookie: engineer.cookie,
        body: { fromRev: 1, reason: "Film coefficient explained." },
        ...at(id),
      }),
    );
    expect(next.rev).toBe(2);
    expect(
      codeOf(await call(revisions.POST, { cookie: engineer.cookie, body: { fromRev: 1, reason: "Again." }, ...at(id) })),
    ).toBe("wrong-state");
    const second = await readDraft(engineer, id);
    expect(second).toMatchObject({ rev: 2, version: 1, editable: true, answers: [{ line: "A6.08", by: "A-027" }] });

    const document = second.document;
    document.lines["A6.08"] = {
      typed: "45",
      unit: "W/(m²·K)",
      si: null,
      source: { kind: "derived", note: "free convection, sheet FC-1" },
    };
    got(await save(engineer, id, 1, document));
    const prepared = got<PreparedView>(await run(engineer, id, 2));
    expect(prepared.content).toMatchObject({ rev: 2, reason: "Film coefficient explained." });
    expect(prepared.content.changedSince.map(({ line }) => line)).toEqual(["A6.08"]);
    got(await act(engineer, "E-114", id, "sign", { rev: 2 }));
    const countersigned = got<ReceiptView>(
      await act(approver, "A-027", id, "countersign", {
        rev: 2,
        change: { conditions: ["Repeat when the bottles are replaced."] },
      }),
    );

    const final = await read(auditor, id);
    expect(final).toMatchObject({
      rev: 2,
      state: "countersigned",
      draft: null,
      revisions: [
        { rev: 2, state: "countersigned" },
        { rev: 1, state: "superseded" },
      ],
    });
    expect(final.signatures.map(({ act: name, badge }) => `${name} ${badge}`)).toEqual(["signed E-114", "countersigned A-027"]);
    expect(final.signatures[1]).toMatchObject({ conditions: ["Repeat when the bottles are replaced."], seq: countersigned.seq });
    expect((await read(auditor, id, "?rev=1")).signatures.map(({ act: name }) => name)).toEqual(["signed", "returned"]);

    const rows = got<Page<EntryRow>>(await call(log.GET, { cookie: auditor.cookie, query: `?record=${final.record}` })).rows;
    expect(rows.map(({ kind, by }) => `${kind} ${by}`)).toEqual([
      "screening_superseded A-027",
      "screening_countersigned A-027",
      "screening_signed E-114",
      "screening_returned A-027",
      "screening_signed E-114",
    ]);
    const shown = got<EntryView>(await call(entry.GET, { cookie: auditor.cookie, params: { seq: String(countersigned.seq) } }));
    expect(shown.hash).toBe(countersigned.hash);
    expect(shown.facts).toEqual(
      expect.arrayContaining([{ label: "Condition 1", value: "Repeat when the bottles are replaced." }]),
    );
    await verified(auditor.cookie, 0);
  });

  it("may end with a withdrawal, by the author before and by an approver after the countersignature", async () => {
    const early = await computed();
    got(await act(engineer, "E-114", early, "sign"));
    expect(codeOf(await open(approver, early, "withdraw"))).toBe("not-allowed");
    got(await act(engineer, "E-114", early, "withdraw"));
    expect((await read(engineer, early)).state).toBe("withdrawn");

    const late = await computed();
    got(await act(engineer, "E-114", late, "sign"));
    got(await act(approver, "A-027", late, "countersign"));
    expect(codeOf(await open(engineer, late, "withdraw"))).toBe("not-allowed");
    got(await act(approver, "A-027", late, "withdraw"));
    expect(await read(engineer, late)).toMatchObject({ state: "withdrawn", may: { revise: true } });
  });

  it("keeps a hand in the work apart from the decision, whatever role the person has later", async () => {
    const person = await import("@/app/api/v1/people/[personId]/route");
    const signInRoute = await import("./ground");
    const { cookie, id: personId } = await join(administrator, {
      badge: "E-116",
      role: "engineer",
      facilityIds: [(await read(engineer, await computed())).facility.id],
    });
    const helper = { cookie, id: personId };
    const { id } = await makeScreening(engineer.cookie, sectionId);
    got(await save(helper, id, 1, nitrogenBottleBank()));
    got(await save(engineer, id, 2, nitrogenBottleBank()));
    got(await run(engineer, id, 3));
    got(await act(engineer, "E-114", id, "sign"));
    got(
      await call(person.POST, {
        cookie: administrator,
        params: { personId },
        body: { act: "change-role", role: "approver", reason: "Promoted." },
      }),
    );
    const promoted = { cookie: await signInRoute.signIn("E-116"), id: personId };
    expect(codeOf(await open(promoted, id, "countersign"))).toBe("own-work");
    expect(await read(promoted, id)).toMatchObject({
      may: { decide: false },
      whyNot: expect.stringContaining("had a hand") as string,
    });
  });
});

async function verified(cookie: string, withheld: number): Promise<void> {
  const first = got<VerificationView>(await call(verification.GET, { cookie, query: "?from=1&limit=5" }));
  const check = createVerification({ origin: first.origin, knownHeads: [first.head] });
  let rows = first.rows;
  while (rows.length > 0) {
    for (const row of rows) check.push(row);
    rows = got<VerificationView>(await call(verification.GET, { cookie, query: `?from=${(rows.at(-1)?.seq ?? 0) + 1}` })).rows;
  }
  const verdict = check.finish();
  expect({ holds: verdict.holds, broken: verdict.broken, faults: verdict.faults, withheld: verdict.withheld }).toEqual({
    holds: true,
    broken: [],
    faults: [],
    withheld,
  });
}

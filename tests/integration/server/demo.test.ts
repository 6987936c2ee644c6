import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { loadDemo } from "@db/seed/demo";
import { createVerification } from "@/ledger/verify-ledger";
import { viewerFromCookie, type Viewer } from "@/server/auth/viewer";
import { getDesk } from "@/server/desk/read";
import { listDemoAccounts } from "@/server/demo/read";
import { listVerification } from "@/server/log/read";
import { getScreening, listScreenings } from "@/server/screenings/read";
import * as password from "@/app/api/v1/password/route";
import { call, closeGround, got, openGround, signIn } from "./ground";

beforeAll(async () => {
  await openGround();
  process.env.EBBMARK_DEMO = "1";
  expect(await listDemoAccounts()).toEqual([]);
  expect(await loadDemo()).toBe(true);
}, 120_000);
afterAll(closeGround);

const accounts = async () => Object.fromEntries((await listDemoAccounts()).map((one) => [one.badge, one]));
async function as(badge: string): Promise<{ viewer: Viewer; cookie: string }> {
  const cookie = await signIn(badge, (await accounts())[badge]?.password);
  const viewer = await viewerFromCookie(cookie.slice(3));
  if (!viewer) throw new Error(`${badge} has no session`);
  return { viewer, cookie };
}

describe("the demo", () => {
  it("lets each of four roles in with the password it prints", async () => {
    expect(Object.values(await accounts()).map(({ role }) => role)).toEqual(["engineer", "approver", "auditor", "administrator"]);
    for (const badge of Object.keys(await accounts())) expect((await as(badge)).viewer.mustChangePassword).toBe(false);
  });

  it("has one record countersigned, one waiting for the approver, one to be signed, all marked as demo", async () => {
    const { viewer } = await as("E-114");
    const { rows } = await listScreenings(viewer);
    expect(rows.map(({ section, state, author }) => `${section.tag} ${state} ${author.badge}`)).toEqual([
      "IS-52 computed E-114",
      "IS-52 signed E-114",
      "IS-08 countersigned E-114",
    ]);
    for (const { id } of rows)
      expect((await getScreening(viewer, id))?.prepared?.content.facility).toMatchObject({ name: "Varn Reach", demo: true });
    expect((await getDesk((await as("A-027")).viewer)).waits.map(({ title }) => title)).toEqual(["Single bottle, cold blowdown"]);
    expect((await getDesk((await as("U-009")).viewer)).yours).toHaveLength(2);
  });

  it("keeps the export gas a gas, and says on the record that the password stood in for a stronger proof", async () => {
    const { viewer } = await as("U-009");
    const loop = (await listScreenings(viewer)).rows.find(({ section }) => section.tag === "IS-08");
    const view = await getScreening(viewer, loop?.id ?? "");
    const result = view?.prepared?.runs[0]?.result;
    expect(new Set(result?.series.vapourMoleFraction)).toEqual(new Set([1]));
    expect(result?.cautionIds).not.toContain("C3");
    expect(result?.summary.energyClosure).toBeLessThan(1e-6);
    expect(view?.signatures.map(({ method }) => method)).toEqual([
      "Password again (demo policy)",
      "Password again (demo policy)",
    ]);
  });

  it("has a log that holds from its first entry", async () => {
    const { viewer } = await as("U-009");
    const { origin, head, rows } = await listVerification(viewer, { from: 1, limit: 500 });
    const check = createVerification({ origin, knownHeads: [head] });
    for (const row of rows) check.push(row);
    expect(check.finish()).toMatchObject({ holds: true, broken: [], faults: [], withheld: 0, size: head.seq });
  });

  it("changes nothing when it is loaded again", async () => {
    const { viewer } = await as("U-009");
    const before = (await getDesk(viewer)).log;
    expect(await loadDemo()).toBe(true);
    expect((await getDesk(viewer)).log).toEqual(before);
  });

  it("no longer shows a password that somebody changed", async () => {
    const { cookie } = await as("D-001");
    got(
      await call(password.POST, {
        cookie,
        body: { current: (await accounts())["D-001"]?.password, next: "only I know this one" },
      }),
    );
    expect((await accounts())["D-001"]?.password).toBe("");
    expect((await accounts())["E-114"]?.password).not.toBe("");
  });
});

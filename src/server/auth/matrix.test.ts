import { describe, expect, it } from "vitest";
import { roles, type Role } from "@/contracts/roles";
import { Refusal } from "@/server/refusal";
import { authorise, mayDo, reachOf, type Matter } from "./authorise";
import { acts, ruleFor, systemActs, type Act, type Rule } from "./matrix";
import type { Viewer } from "./viewer";

/** A copy on purpose: whoever changes the matrix says so here as well. Engineer, approver, auditor, administrator. */
const frozen: Record<Act, string> = {
  "session.read": "Y Y Y Y",
  "session.close": "Y Y Y Y",
  "account.read": "O O O O",
  "account.change": "O O O O",
  "desk.read": "Y Y Y Y",
  "person.list": "- - - Y",
  "person.enrol": "- - - Y",
  "person.change": "- - - X",
  "facility.list": "M M Y Y",
  "facility.read": "M M Y Y",
  "facility.create": "- - - Y",
  "member.change": "- - - X",
  "section.list": "M M Y -",
  "section.read": "M M Y -",
  "section.create": "M - - -",
  "screening.list": "M M S -",
  "screening.read": "M M S -",
  "screening.create": "M - - -",
  "draft.read": "M M - -",
  "draft.edit": "M - - -",
  "draft.compute": "M - - -",
  "screening.sign": "C - - -",
  "screening.countersign": "- N - -",
  "screening.return": "- N - -",
  "screening.withdraw-signed": "O - - -",
  "screening.withdraw-countersigned": "- N - -",
  "screening.revise": "M - - -",
  "calculation.run": "Y Y - -",
  "log.list": "M M Y E",
  "log.read": "M M Y E",
  "log.verify": "Y Y Y Y",
};

const me = "11111111-1111-4111-8111-111111111111";
const other = "22222222-2222-4222-8222-222222222222";
const here = "33333333-3333-4333-8333-333333333333";
const there = "44444444-4444-4444-8444-444444444444";

/** The symbol that makes a `Viewer` is private to its file; a test stands outside of it. */
const viewer = (role: Role | "system", active = true): Viewer =>
  ({
    id: me,
    badge: "E-114",
    role,
    active,
    facilityIds: new Set([here]),
    mustChangePassword: false,
    sessionId: null,
  }) as unknown as Viewer;

const refusalOf = (act: Act, role: Role, matter: Matter, active = true): string => {
  try {
    authorise(viewer(role, active), act, matter);
    return "allowed";
  } catch (error) {
    if (error instanceof Refusal) return error.code;
    throw error;
  }
};

describe("the matrix", () => {
  it("is the one that was agreed", () => {
    const now = Object.fromEntries(acts.map((act) => [act, roles.map((role) => ruleFor(act, role)).join(" ")]));
    expect(now).toEqual(frozen);
  });

  it("gives the administrator nothing that shows a screening, and the auditor nothing that changes one", () => {
    for (const act of acts.filter((one) => /^(screening|draft|section)\./.test(one))) {
      expect(ruleFor(act, "administrator"), act).toBe("-");
      if (!/\.(list|read)$/.test(act)) expect(ruleFor(act, "auditor"), act).toBe("-");
    }
  });

  it("lets no role both sign and countersign", () => {
    for (const role of roles) expect([ruleFor("screening.sign", role), ruleFor("screening.countersign", role)]).toContain("-");
  });
});

/** What each rule answers: [matter, code]. Held against every act and role that has the rule. */
const meaning: Record<Rule, [string, Matter, string][]> = {
  Y: [["anything", {}, "allowed"]],
  E: [["anything", {}, "allowed"]],
  "-": [["even one's own", { facilityId: here, authorId: me, personId: me, contributors: [me], signed: true }, "not-allowed"]],
  M: [
    ["one's own facility", { facilityId: here }, "allowed"],
    ["another facility", { facilityId: there }, "not-found"],
    ["no facility", {}, "not-found"],
  ],
  C: [
    ["one's own work", { facilityId: here, authorId: me, contributors: [me] }, "allowed"],
    ["work one had a hand in", { facilityId: here, authorId: other, contributors: [me, other] }, "allowed"],
    ["work of others", { facilityId: here, authorId: other, contributors: [other] }, "not-allowed"],
    ["one's own work elsewhere", { facilityId: there, authorId: me, contributors: [me] }, "not-found"],
  ],
  N: [
    ["work of others", { facilityId: here, authorId: other, contributors: [other] }, "allowed"],
    ["one's own work", { facilityId: here, authorId: me, contributors: [me] }, "own-work"],
    ["work one had a hand in", { facilityId: here, authorId: other, contributors: [other, me] }, "own-work"],
    ["work of others elsewhere", { facilityId: there, authorId: other, contributors: [other] }, "not-found"],
    ["work whose hands are not known", { facilityId: here }, "not-found"],
  ],
  O: [
    ["oneself", { personId: me }, "allowed"],
    ["another", { personId: other }, "not-allowed"],
    ["nobody", {}, "not-allowed"],
    ["one's own work", { facilityId: here, authorId: me }, "allowed"],
    ["work of another", { facilityId: here, authorId: other }, "not-allowed"],
    ["one's own work elsewhere", { facilityId: there, authorId: me }, "not-found"],
  ],
  S: [
    ["what is signed", { facilityId: there, signed: true }, "allowed"],
    ["what is not", { facilityId: here, signed: false }, "not-found"],
    ["what is not known to be", { facilityId: here }, "not-found"],
  ],
  X: [
    ["another", { personId: other }, "allowed"],
    ["oneself", { personId: me }, "not-allowed"],
    ["nobody", {}, "not-allowed"],
  ],
};

describe("authorise", () => {
  const cells = acts.flatMap((act) =>
    roles.flatMap((role) => meaning[ruleFor(act, role)].map(([what, matter, code]) => ({ act, role, what, matter, code }))),
  );
  it.each(cells)("answers the $role who asks $act for $what: $code", ({ act, role, matter, code }) => {
    expect(refusalOf(act, role, matter)).toBe(code);
  });

  it("refuses everything to a disabled person", () => {
    for (const act of acts)
      for (const role of roles) expect(refusalOf(act, role, { facilityId: here, personId: me }, false)).toBe("account-disabled");
  });

  it("lets a job do only what is listed for jobs", () => {
    for (const act of acts) expect(mayDo(viewer("system"), act, { facilityId: here }), act).toBe(systemActs.includes(act));
  });
});

describe("reachOf", () => {
  it("is the own facilities under M, all under Y, S and E, and a refusal where there is no such act", () => {
    expect(reachOf(viewer("engineer"), "screening.list")).toEqual(new Set([here]));
    expect(reachOf(viewer("auditor"), "screening.list")).toBe("all");
    expect(reachOf(viewer("administrator"), "log.list")).toBe("all");
    expect(() => reachOf(viewer("administrator"), "screening.list")).toThrow(Refusal);
    expect(() => reachOf(viewer("system"), "screening.list")).toThrow(Refusal);
  });
});

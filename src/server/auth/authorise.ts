import "server-only";
import { Refusal } from "@/server/refusal";
import { ruleFor, systemActs, type Act, type Rule } from "./matrix";
import type { Viewer } from "./viewer";

/** What the act is about. A rule that needs a fact which is not given refuses. */
export type Matter = {
  facilityId?: string;
  /** The person an act is done to. */
  personId?: string;
  authorId?: string;
  contributors?: readonly string[];
  /** Something of it is signed. */
  signed?: boolean;
};

/**
 * The one question every read and write asks before it does anything.
 *
 * Throws   Refusal: "not-allowed" where the role has no such act at all, "not-found" where the matter is not open to this person (not
 *          yours looks like not there), "own-work" where an approver had a hand in it.
 */
export function authorise(viewer: Viewer, act: Act, matter: Matter = {}): void {
  if (viewer.role === "system") {
    if (!systemActs.includes(act)) throw new Refusal("not-allowed");
    return;
  }
  if (!viewer.active) throw new Refusal("account-disabled");
  const rule = ruleFor(act, viewer.role);
  const refusal = refusalUnder(rule, viewer, matter);
  if (refusal) throw new Refusal(refusal);
}

/** The same question with a plain answer, for menus and buttons. */
export function mayDo(viewer: Viewer, act: Act, matter: Matter = {}): boolean {
  try {
    authorise(viewer, act, matter);
    return true;
  } catch (error) {
    if (error instanceof Refusal) return false;
    throw error;
  }
}

/**
 * Which facilities a list may show: all of them, or the viewer's own (perhaps none).
 *
 * Throws   Refusal "not-allowed" where the role has no such act
 */
export function reachOf(viewer: Viewer, act: Act): "all" | ReadonlySet<string> {
  if (viewer.role === "system") throw new Refusal("not-allowed");
  if (!viewer.active) throw new Refusal("account-disabled");
  const rule = ruleFor(act, viewer.role);
  if (rule === "M") return viewer.facilityIds;
  if (rule === "Y" || rule === "S" || rule === "E") return "all";
  throw new Refusal("not-allowed");
}

function refusalUnder(rule: Rule, viewer: Viewer, matter: Matter): "not-allowed" | "not-found" | "own-work" | undefined {
  const member = matter.facilityId !== undefined && viewer.facilityIds.has(matter.facilityId);
  const hadAHand = matter.authorId === viewer.id || (matter.contributors?.includes(viewer.id) ?? false);
  const known = matter.authorId !== undefined || matter.contributors !== undefined;
  switch (rule) {
    case "Y":
    case "E":
      return undefined;
    case "M":
      return member ? undefined : "not-found";
    case "C":
      if (!member) return "not-found";
      return hadAHand ? undefined : "not-allowed";
    case "N":
      if (!member || !known) return "not-found";
      return hadAHand ? "own-work" : undefined;
    case "O":
      if (matter.facilityId !== undefined && !member) return "not-found";
      return matter.personId === viewer.id || matter.authorId === viewer.id ? undefined : "not-allowed";
    case "S":
      return matter.signed ? undefined : "not-found";
    case "X":
      return matter.personId !== undefined && matter.personId !== viewer.id ? undefined : "not-allowed";
    case "-":
      return "not-allowed";
  }
}

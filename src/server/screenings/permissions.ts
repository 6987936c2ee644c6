import "server-only";
import type { ScreeningView } from "@/contracts/views";
import { mayDo } from "@/server/auth/authorise";
import type { Viewer } from "@/server/auth/viewer";
import { matterOf, openDraft, type Found } from "./matter";

/** What the viewer may do with one revision now, for menus and buttons. The writes ask again, and the database a third time. */
export function permissions(viewer: Viewer, found: Found, rev: number): Pick<ScreeningView, "may" | "whyNot"> {
  const matter = matterOf(found, rev);
  const open = openDraft(found);
  const isOpen = open?.rev === rev;
  const state = found.signed.find((one) => one.rev === rev)?.state;
  const current = open !== undefined && open.preparedVersion === open.version;
  const decides = state === "signed" && viewer.role === "approver";
  return {
    may: {
      edit: isOpen && mayDo(viewer, "draft.edit", matter),
      compute: isOpen && mayDo(viewer, "draft.compute", matter),
      sign: isOpen && current && mayDo(viewer, "screening.sign", matter),
      decide: decides && mayDo(viewer, "screening.countersign", matter),
      withdraw:
        (state === "signed" && mayDo(viewer, "screening.withdraw-signed", matter)) ||
        (state === "countersigned" && mayDo(viewer, "screening.withdraw-countersigned", matter)),
      revise: revisable(found) === rev && mayDo(viewer, "screening.revise", matter),
    },
    whyNot:
      decides && !mayDo(viewer, "screening.countersign", matter)
        ? "You had a hand in this revision, so another approver decides."
        : null,
  };
}

/** The revision a new one can start from: the newest, once it was decided on or taken back, and while nothing newer is begun. */
export function revisable(found: Found): number | undefined {
  const last = found.signed[0];
  if (!last || openDraft(found)) return undefined;
  return ["returned", "countersigned", "withdrawn"].includes(last.state) ? last.rev : undefined;
}

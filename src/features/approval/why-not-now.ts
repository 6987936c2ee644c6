import type { ScreeningView } from "@/contracts/views";

type Reason = { title: string; words: string };

/** Why a revision can't be signed by this person now. */
export function whyNotSign({ state, rev, prepared }: ScreeningView): Reason {
  if (state !== "draft" && state !== "computed")
    return { title: `Revision ${rev} is signed already`, words: "A change makes the next revision." };
  if (!prepared)
    return {
      title: "There is nothing to sign yet",
      words: "Compute in full first: a signature stands for figures that the server has computed and stored.",
    };
  if (prepared.stale)
    return {
      title: "The lines have changed since the last run",
      words: "Compute again first: a signature stands for the figures of the lines as they are.",
    };
  return { title: "You can’t sign this revision", words: "Only an engineer who worked on its lines signs a revision." };
}

/** Why a revision can't be decided on by this person now. */
export function whyNotDecide({ state, rev, whyNot, signatures, author, facility }: ScreeningView, viewerId: string): Reason {
  if (whyNot) return { title: "Another approver decides", words: whyNot };
  const decision = signatures.find(({ act }) => act === "countersigned" || act === "returned");
  if (decision)
    return { title: `Revision ${rev} has been decided`, words: `${decision.badge} ${decision.act} it, entry ${decision.seq}.` };
  if (state === "draft" || state === "computed")
    return { title: "There is nothing to decide yet", words: "The revision is not signed." };
  if (state !== "signed") return { title: `Revision ${rev} is ${state}`, words: "It is not open for a decision." };
  if (author.id === viewerId) {
    return {
      title: "You prepared this revision",
      words: `Nobody decides on their own work. An approver of ${facility.name} decides.`,
    };
  }
  return { title: "You can’t decide on this record", words: "Only an approver of its facility who had no hand in it decides." };
}

/** How a figure stands to its limit. Under the mark, on it, over it, or no mark at all. */
export type Verdict = "within" | "near" | "beyond" | "open";

export const verdictWords: Record<Verdict, string> = { within: "Within", near: "Near", beyond: "Beyond", open: "Open" };

/** Text colour of each verdict. Written out, because Tailwind keeps only the class names it can read. */
export const verdictInk: Record<Verdict, string> = {
  within: "text-within",
  near: "text-near",
  beyond: "text-beyond",
  open: "text-open",
};

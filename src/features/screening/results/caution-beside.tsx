import type { BlowdownResult } from "@/engine/cases/blowdown-result";

/** A caution beside the figures that it concerns, in the words that stand with the result. */
export function CautionBeside({ id, result }: { id: string; result: Pick<BlowdownResult, "cautions" | "cautionIds"> }) {
  const words = result.cautions[result.cautionIds.indexOf(id)];
  if (!words) return null;
  return (
    <p className="pt-2 font-serif text-note text-ink-2">
      <b className="mr-1.5 font-cond text-label font-semibold text-near">{id}</b>
      {words}
    </p>
  );
}

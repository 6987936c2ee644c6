import { CautionBlock } from "@/components/caution/caution-block";
import type { RecordContent } from "@/contracts/record-content";

/** All cautions of the record but C6, which stands in the margin over the lines it speaks of. */
export function StandingCautions({ content, title }: { content: RecordContent; title?: string }) {
  const here = content.cautions.filter(({ id }) => id !== "C6");
  const inMargin = content.cautions.some(({ id }) => id === "C6");
  return (
    <CautionBlock
      cautions={here}
      {...(title ? { title } : {})}
      also={
        inMargin && (
          <>
            Also standing, beside what it concerns: <a href="#assumed">C6 in the margin</a>.
          </>
        )
      }
    />
  );
}

import { MarginHead, MarginNote } from "@/components/shell/margin";
import { screeningCaution } from "@/engine/cautions";
import type { Warning } from "@/engine/cases/warning";

/** What the engine has to say about the state in hand, and the caution that stands with every figure. */
export function WarningNotes({ title, warnings }: { title: string; warnings: readonly Warning[] }) {
  const once = [...new Map(warnings.map((warning) => [warning.message, warning])).values()];
  return (
    <>
      {once.length > 0 && (
        <>
          <MarginHead>{title}</MarginHead>
          {once.map(({ code, message }) => (
            <MarginNote key={code + message}>{message}</MarginNote>
          ))}
        </>
      )}
      <MarginHead>Caution</MarginHead>
      <MarginNote no={screeningCaution.id} caution>
        {screeningCaution.words}
      </MarginNote>
    </>
  );
}

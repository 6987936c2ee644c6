import { VerdictWord } from "@/components/verdict/verdict-word";
import type { PreparedView } from "@/contracts/views";
import { Limits } from "./limits";
import { SecondRun } from "./second-run";
import { Warnings } from "./warnings";

/** Every limit of every case, the doubts of the engine, and how far a tighter run moves the figures. */
export function HoldsPanel({ prepared: { content, runs } }: { prepared: PreparedView }) {
  return (
    <div className="grid gap-5">
      {content.cases.map((recordCase) => {
        const run = runs.find(({ letter }) => letter === recordCase.letter);
        if (!run) return null;
        return (
          <div key={recordCase.letter} className="min-w-0">
            {content.cases.length > 1 && (
              <p className="pb-1">
                Case {recordCase.letter} <VerdictWord verdict={recordCase.verdict} />
              </p>
            )}
            <Limits recordCase={recordCase} run={run} />
            <div className="mt-5">
              <SecondRun recordCase={recordCase} run={run} />
            </div>
          </div>
        );
      })}
      <Warnings cases={content.cases} />
    </div>
  );
}

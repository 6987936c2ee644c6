"use client";

import { Figure } from "@/components/verdict/figure";
import { VerdictSentence } from "@/components/verdict/verdict-sentence";
import type { RecordContent } from "@/contracts/record-content";
import type { CaseRunView } from "@/contracts/views";
import { decidingCase, governingOf, governingWords } from "./governing";
import { useShowing } from "./use-showing";

/** The headline: the sentence stored with the record, and the figure it rests on in the units shown. */
export function VerdictHead({ content, runs }: { content: RecordContent; runs: readonly CaseRunView[] }) {
  const showing = useShowing();
  const deciding = decidingCase(content, runs);
  const governing = deciding && governingOf(deciding.recordCase, deciding.run);
  return (
    <VerdictSentence
      verdict={content.verdict}
      figure={
        deciding &&
        governing && (
          <Figure label={`Governing figure, line ${governing.line}`} {...governingWords(governing, deciding.run, showing)} />
        )
      }
    >
      {content.sentence}
    </VerdictSentence>
  );
}

/**
 * The engine as one module: document or text in, result or error document out, with the canonical case and its hash.
 *
 * Bundled by `src/ops/build-engine.mjs` into one file that the command line, the server's threads and the study worker load by path; the
 * browser's worker bundles the same sources. Nothing here knows a file, a clock or a process: the caller hands in what it has.
 */
import { sha256 } from "@noble/hashes/sha2.js";
import { bytesToHex, utf8ToBytes } from "@noble/hashes/utils.js";
import canonicalize from "canonicalize";
import { parseCase, parseCaseText, type CaseFile, type CaseProblem, type ParsedCase } from "@/contracts/case-file";
import type { BlowdownResult, Confirmation } from "@/engine/cases/blowdown-result";
import { EngineError } from "@/engine/errors";
import { describeMethods } from "@/engine/methods/run-method";
import type { Outcome as RunOutcome, StudyCase } from "@/engine/cases/study-case";
import { assembleParts, runCase, runConfirmed, type EngineResult } from "@/engine/run-case";
import { planOf } from "@/engine/studies/plan";
import { runPart } from "@/engine/studies/run-study";

export type ErrorDocument = { format: "ebbmark-error/1"; code: string; problems: CaseProblem[] };

/** `status` is the exit status of the command line: 0 computed, 2 invalid case, 3 valid but cannot be computed. */
export type Refused = { status: 2 | 3; error: ErrorDocument };
export type Outcome = Computed | Refused;
export type Computed = {
  status: 0;
  document: CaseFile;
  /** RFC 8785 text of the case with every default written out, and its SHA-256 over the UTF-8 bytes. */
  caseText: string;
  caseSha256: string;
  result: EngineResult;
  /** RFC 8785 text of the result without `numerics.wallClockMs`: what is stored and hashed. */
  resultText: string;
};
export type ComputedTwice = Computed & { result: BlowdownResult; confirmation: Confirmation; confirmationText: string };

export type EntryContext = {
  engineVersion: string;
  onProgress?: (part: number) => void;
  isCancelled?: () => boolean;
  now?: () => number;
  coarse?: boolean;
};

export function runText(text: string, context: EntryContext): Outcome {
  return run(parseCaseText(text), context);
}

export function runDocument(document: unknown, context: EntryContext): Outcome {
  return run(parseCase(document), context);
}

/** A blowdown and the same again at a tenfold tighter tolerance. */
export function runDocumentTwice(document: unknown, context: EntryContext): ComputedTwice | Refused {
  const parsed = parseCase(document);
  if (!parsed.ok) return invalid(parsed.problems);
  const { document: complete } = parsed;
  if (complete.kind !== "blowdown")
    return invalid([{ path: "kind", message: "Only a blowdown is run twice. Run this kind once." }]);
  const hashed = canonicalCase(complete);
  return refusing(() => {
    const { result, confirmation } = runConfirmed(complete, { ...context, caseSha256: hashed.caseSha256 });
    return {
      status: 0,
      document: complete,
      ...hashed,
      result,
      resultText: hashable(result),
      confirmation,
      confirmationText: canonicalText({ ...confirmation, result: withoutClock(confirmation.result) }),
    };
  });
}

/** How many runs a study has; they do not depend on each other, and several workers may share them. */
export function countStudyRuns(document: unknown): { status: 0; runs: number } | Refused {
  return withStudy(document, (study) => ({ status: 0, runs: planOf(study).runs }));
}

/** Runs `from` up to, not including, `to` of a study. */
export function runStudyPart(
  document: unknown,
  { from, to }: { from: number; to: number },
  context: EntryContext,
): { status: 0; outcomes: RunOutcome[] } | Refused {
  return withStudy(document, (study) => ({ status: 0, outcomes: runPart(study, from, to, context) }));
}

/** The result of a study from what its parts left, in any order; also of one that was stopped before all were done. */
export function assembleStudyParts(document: unknown, outcomes: readonly RunOutcome[], context: EntryContext): Outcome {
  return withStudy(document, (study): Computed => {
    const hashed = canonicalCase(study);
    const result = assembleParts(study, outcomes, { ...context, caseSha256: hashed.caseSha256 });
    return { status: 0, document: study, ...hashed, result, resultText: hashable(result) };
  });
}

function withStudy<Answer extends { status: 0 }>(document: unknown, work: (study: StudyCase) => Answer): Answer | Refused {
  const parsed = parseCase(document);
  if (!parsed.ok) return invalid(parsed.problems);
  const { document: complete } = parsed;
  if (complete.kind !== "study") return invalid([{ path: "kind", message: "Only a study has parts. Run this kind as a whole." }]);
  return refusing(() => work(complete));
}

export function canonicalCase(document: CaseFile): { caseText: string; caseSha256: string } {
  const caseText = canonicalText(document);
  return { caseText, caseSha256: bytesToHex(sha256(utf8ToBytes(caseText))) };
}

export { describeMethods, parseCase, parseCaseText };

function run(parsed: ParsedCase, context: EntryContext): Outcome {
  if (!parsed.ok) return invalid(parsed.problems);
  const { document } = parsed;
  const hashed = canonicalCase(document);
  return refusing(() => {
    const result = runCase(document, { ...context, caseSha256: hashed.caseSha256 });
    return { status: 0, document, ...hashed, result, resultText: hashable(result) };
  });
}

const invalid = (problems: CaseProblem[]) => ({
  status: 2 as const,
  error: { format: "ebbmark-error/1" as const, code: "invalid-case", problems },
});

/** A refusal of the engine becomes an error document; any other error is a fault of ours and goes on up. */
function refusing<T extends { status: 0 }>(work: () => T): T | Refused {
  try {
    return work();
  } catch (error) {
    if (!(error instanceof EngineError)) throw error;
    if (error.code === "invalid-case") return invalid(error.problems);
    return {
      status: 3,
      error: { format: "ebbmark-error/1", code: error.code, problems: error.problems },
    };
  }
}

const hashable = (result: EngineResult): string => canonicalText("numerics" in result ? withoutClock(result) : result);

function withoutClock({ numerics, ...rest }: Extract<EngineResult, { numerics: unknown }>) {
  const { wallClockMs: _wallClockMs, ...counted } = numerics;
  return { ...rest, numerics: counted };
}

function canonicalText(value: object): string {
  const text = canonicalize(value);
  if (text === undefined) throw new RangeError("the document has no canonical form");
  return text;
}

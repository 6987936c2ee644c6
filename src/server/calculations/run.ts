import "server-only";
import type { EngineResult } from "@/engine/run-case";
import { screeningCaution } from "@/engine/cautions";
import { authorise } from "@/server/auth/authorise";
import type { Viewer } from "@/server/auth/viewer";
import { runOnce, runStudy } from "@/server/engine/run-in-thread";

/** A result with what must stand beside it. Kinds that are no blowdown carry no cautions of their own, so the first one goes with them. */
export type CalculationAnswer = { caseSha256: string; result: EngineResult; cautions: string[] };

/** Computes any case document and stores nothing. */
export async function calculate(viewer: Viewer, document: unknown): Promise<CalculationAnswer> {
  authorise(viewer, "calculation.run");
  const { caseSha256, result } = await (isStudy(document) ? runStudy(document) : runOnce(document));
  return { caseSha256, result, cautions: "cautions" in result ? result.cautions : [screeningCaution.words] };
}

const isStudy = (document: unknown): boolean =>
  typeof document === "object" && document !== null && "kind" in document && document.kind === "study";

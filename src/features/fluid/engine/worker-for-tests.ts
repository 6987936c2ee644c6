import { vi } from "vitest";
import { EngineError } from "@/engine/errors";
import type { FluidRequest, PreviewAnswer } from "@/workers/browser";
import { answerFluid } from "@/workers/fluid-asks";

/** For tests of pages: the engine itself behind the face of a worker, answering in the next turn. */
export function stubWorker(): void {
  vi.stubGlobal(
    "Worker",
    class {
      onmessage: ((event: { data: PreviewAnswer }) => void) | null = null;
      onerror = null;
      postMessage({ id, ask }: FluidRequest) {
        setTimeout(() => this.onmessage?.({ data: answered(id, ask) }), 0);
      }
      terminate() {
        this.onmessage = null;
      }
    },
  );
}

function answered(id: number, ask: FluidRequest["ask"]): PreviewAnswer {
  try {
    return { type: "fluid", id, answer: answerFluid(ask) };
  } catch (error) {
    if (!(error instanceof EngineError)) throw error;
    const problems = [{ path: error.path ?? "", message: error.message }];
    return { type: "refused", id, error: { format: "ebbmark-error/1", code: error.code, problems } };
  }
}

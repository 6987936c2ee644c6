import type { StudyAnswer, StudyRequest } from "@/workers/study";

type Ask = StudyRequest extends infer One ? (One extends StudyRequest ? Omit<One, "id"> : never) : never;
export type FinalAnswer = Exclude<StudyAnswer, { type: "progress" }>;

/** A worker that is asked one thing at a time. */
export type StudyWorker = { ask: (request: Ask, onProgress?: (part: number) => void) => Promise<FinalAnswer>; end: () => void };

export function startStudyWorker(): StudyWorker {
  const worker = new Worker(new URL("../../../workers/study.ts", import.meta.url), { type: "module" });
  let id = 0;
  return {
    ask: (request, onProgress) =>
      new Promise((resolve) => {
        id += 1;
        const asked = id;
        worker.onerror = () =>
          resolve({
            type: "failed",
            id: asked,
            message: "The study could not be run in this browser. Reload the page and try again.",
          });
        worker.onmessage = ({ data }: MessageEvent<StudyAnswer>) => {
          if (data.id !== asked) return;
          if (data.type === "progress") onProgress?.(data.part);
          else resolve(data);
        };
        worker.postMessage({ ...request, id: asked } satisfies StudyRequest);
      }),
    end: () => worker.terminate(),
  };
}

/** What stands in the way, in words; undefined for an answer that has what was asked. */
export function troubleOf(answer: FinalAnswer): string | undefined {
  if (answer.type === "failed") return answer.message;
  if (answer.type !== "refused") return undefined;
  return answer.error.problems.map(({ message }) => message).join(" ") || "This can’t be computed.";
}

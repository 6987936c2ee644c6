import type { PreviewAnswer, WorkerRequest } from "@/workers/browser";
import type { FluidAnswer, FluidAsk } from "@/workers/fluid-asks";
import { sentence } from "./sentence";

export type Told = { answer: FluidAnswer } | { problem: string };

/** What the client needs of a worker. */
export type EngineWorker = {
  postMessage: (request: WorkerRequest) => void;
  terminate: () => void;
  onmessage: ((event: MessageEvent<PreviewAnswer>) => void) | null;
  onerror: ((event: ErrorEvent) => void) | null;
};

type Live = { id: number; lane: string; ask: FluidAsk; tell: (told: Told) => void; patience: ReturnType<typeof setTimeout> };

/** How long older work may stand in the way of a new ask. Starting a worker anew costs less than that. */
const inTheWayMs = 1_000;
/** An ask that takes longer is given up. */
const patienceMs = 30_000;

const notStarted = "The engine could not be started in this browser. Load the page again.";
const tooLong = "This takes too long with the equation chosen. Choose another equation or fewer components.";

/**
 * Asks the browser's engine and tells the answer to the newest ask in each lane. Older ones are dropped; work that stands in the way for
 * long is ended with its worker, as it can't be broken off from outside.
 *
 * start   makes the worker; called again after one was ended
 */
export class EngineClient {
  private worker: EngineWorker | undefined;
  private readonly live = new Map<string, Live>();
  private busySince: number | undefined;
  private newest = 0;
  /** Starts that failed one after another. */
  private failed = 0;

  constructor(private readonly start: () => EngineWorker) {}

  /**
   * lane      names who asks: a newer ask in a lane takes the place of the older one
   * Returns   a function that takes the ask back
   */
  ask(lane: string, ask: FluidAsk, tell: (told: Told) => void): () => void {
    const id = (this.newest += 1);
    const one: Live = { id, lane, ask, tell, patience: setTimeout(() => this.giveUp(id), patienceMs) };
    this.forget(lane);
    this.live.set(lane, one);
    if (this.busySince !== undefined && performance.now() - this.busySince > inTheWayMs) this.restart();
    else this.post(one);
    return () => {
      if (this.live.get(lane) === one) this.forget(lane);
    };
  }

  end(): void {
    for (const lane of [...this.live.keys()]) this.forget(lane);
    this.stop();
  }

  private post({ id, ask, lane }: Live): void {
    if (!this.worker) {
      this.worker = this.start();
      this.worker.onmessage = ({ data }) => this.hear(data);
      this.worker.onerror = () => this.startAgain();
    }
    this.busySince ??= performance.now();
    this.worker.postMessage({ id, ask, lane });
  }

  private hear(answer: PreviewAnswer): void {
    this.failed = 0;
    if (answer.type === "progress" || answer.type === "result") return;
    if (answer.type === "replaced") return;
    const found = [...this.live.values()].find(({ id }) => id === answer.id);
    if (found) this.forget(found.lane);
    this.busySince = this.live.size > 0 ? performance.now() : undefined;
    found?.tell(toldOf(answer));
  }

  private giveUp(id: number): void {
    const found = [...this.live.values()].find((one) => one.id === id);
    if (!found) return;
    this.forget(found.lane);
    this.restart();
    found.tell({ problem: tooLong });
  }

  /** Its code may not have arrived: a connection that dropped is given one more chance. */
  private startAgain(): void {
    this.failed += 1;
    if (this.failed > 1) return this.failAll(notStarted);
    this.restart();
  }

  private failAll(problem: string): void {
    this.failed = 0;
    const all = [...this.live.values()];
    this.end();
    for (const { tell } of all) tell({ problem });
  }

  /** Ends what runs and asks again for all that still waits, the newest first. */
  private restart(): void {
    this.stop();
    for (const one of [...this.live.values()].sort((a, b) => b.id - a.id)) this.post(one);
  }

  private stop(): void {
    this.worker?.terminate();
    this.worker = undefined;
    this.busySince = undefined;
  }

  private forget(lane: string): void {
    clearTimeout(this.live.get(lane)?.patience);
    this.live.delete(lane);
  }
}

function toldOf(answer: Extract<PreviewAnswer, { type: "fluid" | "refused" | "failed" }>): Told {
  if (answer.type === "fluid") return { answer: answer.answer };
  if (answer.type === "refused")
    return { problem: answer.error.problems.map(({ message }) => sentence(message)).join(" ") || "This can't be computed." };
  return { problem: `The engine stopped: ${answer.message}` };
}

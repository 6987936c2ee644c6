import "server-only";
import { Worker, type ResourceLimits } from "node:worker_threads";

export type PoolSettings = {
  /** Path of the bundled thread file. */
  file: string;
  size: number;
  /** Jobs that may wait; one more is refused. */
  longestQueue: number;
  /** A job that takes longer loses its thread. */
  budgetMs: number;
  resourceLimits?: ResourceLimits;
  workerData?: unknown;
  /** How a job is put to the thread and how its words are read, where they differ from `{ id, job }` and `{ id, done }`. */
  protocol?: Protocol;
};

export type Protocol = {
  ask(id: number, job: unknown): unknown;
  /** Undefined for a message that answers nothing, such as progress. */
  read(message: unknown): { id: number; done: unknown } | { id: number; failed: string } | undefined;
};

export type PoolTrouble = "queue-full" | "out-of-time" | "thread-died" | "stopped";

const plainProtocol: Protocol = {
  ask: (id, job) => ({ id, job }),
  read: (message) => message as { id: number; done: unknown },
};

/** The job was not done, and nothing came of it. */
export class PoolError extends Error {
  override readonly name = "PoolError";
  constructor(
    readonly trouble: PoolTrouble,
    message: string,
  ) {
    super(message);
  }
}

type Waiting = { job: unknown; settle: (answer: unknown) => void; fail: (error: Error) => void };
type Seat = { worker: Worker; online: boolean; busy: { id: number; waiting: Waiting; timer: NodeJS.Timeout | undefined } | null };

/**
 * A few worker threads and one queue. Threads start when first needed and stay; one that dies or runs over its budget is ended, its job
 * answered with a `PoolError`, and the next job gets a new one.
 */
export class ThreadPool {
  private readonly seats: Seat[] = [];
  private readonly queue: Waiting[] = [];
  private nextId = 1;
  private stopped = false;

  private readonly protocol: Protocol;

  constructor(private readonly settings: PoolSettings) {
    this.protocol = settings.protocol ?? plainProtocol;
  }

  run<T>(job: unknown): Promise<T> {
    if (this.stopped) return Promise.reject(new PoolError("stopped", "The pool is stopped."));
    const free = this.seats.some((seat) => !seat.busy) || this.seats.length < this.settings.size;
    if (!free && this.queue.length >= this.settings.longestQueue) {
      return Promise.reject(new PoolError("queue-full", `${this.queue.length} jobs wait already.`));
    }
    return new Promise<T>((resolve, reject) => {
      this.queue.push({ job, settle: (answer) => resolve(answer as T), fail: reject });
      this.serve();
    });
  }

  /** Ends every thread; jobs under way are refused. */
  async stop(): Promise<void> {
    this.stopped = true;
    for (const waiting of this.queue.splice(0)) waiting.fail(new PoolError("stopped", "The pool is stopped."));
    await Promise.all(this.seats.splice(0).map((seat) => this.dismiss(seat, "stopped", "The pool is stopped.")));
  }

  private serve(): void {
    while (this.queue.length > 0) {
      const seat = this.seats.find((candidate) => !candidate.busy) ?? this.newSeat();
      if (!seat) return;
      const waiting = this.queue.shift() as Waiting;
      const id = this.nextId++;
      seat.busy = { id, waiting, timer: undefined };
      if (seat.online) this.startClock(seat);
      seat.worker.ref();
      seat.worker.postMessage(this.protocol.ask(id, waiting.job));
    }
  }

  /** The budget is the job's: a machine that is slow to start a thread does not use it up. */
  private startClock(seat: Seat): void {
    const { budgetMs } = this.settings;
    if (seat.busy)
      seat.busy.timer = setTimeout(
        () => this.drop(seat, "out-of-time", `The thread ran longer than ${budgetMs / 1000} s.`),
        budgetMs,
      );
  }

  private newSeat(): Seat | undefined {
    if (this.seats.length >= this.settings.size) return undefined;
    const { file, workerData, resourceLimits } = this.settings;
    const worker = new Worker(file, { workerData, ...(resourceLimits ? { resourceLimits } : {}) });
    const seat: Seat = { worker, online: false, busy: null };
    worker.on("online", () => {
      seat.online = true;
      this.startClock(seat);
    });
    worker.on("message", (message: unknown) => {
      const answer = this.protocol.read(message);
      if (!seat.busy || answer?.id !== seat.busy.id) return;
      const { waiting, timer } = seat.busy;
      clearTimeout(timer);
      seat.busy = null;
      worker.unref();
      if ("failed" in answer) waiting.fail(new Error(answer.failed));
      else waiting.settle(answer.done);
      this.serve();
    });
    worker.on("error", (error) => this.drop(seat, "thread-died", error.message));
    worker.on("exit", (code) => this.drop(seat, "thread-died", `The thread ended with code ${code}.`));
    worker.unref();
    this.seats.push(seat);
    return seat;
  }

  private drop(seat: Seat, trouble: PoolTrouble, message: string): void {
    const at = this.seats.indexOf(seat);
    if (at < 0) return;
    this.seats.splice(at, 1);
    void this.dismiss(seat, trouble, message);
    this.serve();
  }

  private async dismiss(seat: Seat, trouble: PoolTrouble, message: string): Promise<void> {
    if (seat.busy) {
      clearTimeout(seat.busy.timer);
      seat.busy.waiting.fail(new PoolError(trouble, message));
      seat.busy = null;
    }
    await seat.worker.terminate();
  }
}

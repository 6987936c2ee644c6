import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, afterEach, beforeAll, describe, expect, it } from "vitest";
import { ThreadPool, type PoolSettings } from "./thread-pool";

const folder = mkdtempSync(join(tmpdir(), "ebbmark-pool-"));
const file = join(folder, "thread.mjs");
let pool: ThreadPool | undefined;

beforeAll(() => {
  writeFileSync(
    file,
    `import { parentPort, threadId } from "node:worker_threads";
     parentPort.on("message", ({ id, job }) => {
       if (job.act === "echo") parentPort.postMessage({ id, done: job.value });
       if (job.act === "thread") parentPort.postMessage({ id, done: threadId });
       if (job.act === "wait") setTimeout(() => parentPort.postMessage({ id, done: "waited" }), job.ms);
       if (job.act === "spin") for (;;);
       if (job.act === "die") process.exit(7);
       if (job.act === "throw") throw new Error("broken inside");
     });`,
  );
});
afterEach(async () => {
  await pool?.stop();
});
afterAll(() => rmSync(folder, { recursive: true }));

const make = (settings: Partial<PoolSettings> = {}): ThreadPool =>
  (pool = new ThreadPool({ file, size: 1, longestQueue: 2, budgetMs: 5000, ...settings }));

describe("ThreadPool", () => {
  it("answers jobs in order on one thread", async () => {
    const jobs = make({ longestQueue: 10 });
    const answers = await Promise.all([1, 2, 3].map((value) => jobs.run<number>({ act: "echo", value })));
    expect(answers).toEqual([1, 2, 3]);
  });

  it("keeps a thread for the next job", async () => {
    const jobs = make();
    const first = await jobs.run<number>({ act: "thread" });
    expect(await jobs.run<number>({ act: "thread" })).toBe(first);
  });

  it("refuses a job when the queue is full, and serves those that wait", async () => {
    const jobs = make({ longestQueue: 1 });
    const running = jobs.run({ act: "wait", ms: 50 });
    const waiting = jobs.run({ act: "echo", value: "later" });
    await expect(jobs.run({ act: "echo", value: "too many" })).rejects.toMatchObject({ trouble: "queue-full" });
    expect(await running).toBe("waited");
    expect(await waiting).toBe("later");
  });

  it("ends a thread that runs over its budget and goes on with a new one", async () => {
    const jobs = make({ budgetMs: 1000 });
    await expect(jobs.run({ act: "spin" })).rejects.toMatchObject({ trouble: "out-of-time" });
    expect(await jobs.run({ act: "echo", value: "alive" })).toBe("alive");
  });

  it.each(["die", "throw"])("answers a thread that comes to %s with a refusal, then works again", async (act) => {
    const jobs = make();
    await expect(jobs.run({ act })).rejects.toMatchObject({ trouble: "thread-died" });
    expect(await jobs.run({ act: "echo", value: "alive" })).toBe("alive");
  });

  it("answers a missing thread file with a refusal", async () => {
    await expect(make({ file: join(folder, "none.mjs") }).run({ act: "echo" })).rejects.toMatchObject({ trouble: "thread-died" });
  });

  it("refuses what is under way when it stops", async () => {
    const jobs = make();
    const running = jobs.run({ act: "wait", ms: 5000 });
    const waiting = jobs.run({ act: "echo", value: 1 });
    const outcome = Promise.allSettled([running, waiting]);
    await jobs.stop();
    expect((await outcome).map(({ status }) => status)).toEqual(["rejected", "rejected"]);
    await expect(jobs.run({ act: "echo", value: 1 })).rejects.toMatchObject({ trouble: "stopped" });
  });
});

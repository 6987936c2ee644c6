/** Hashes and compares passwords away from the thread that answers requests: at cost 12 one takes a third of a second. */
import { parentPort } from "node:worker_threads";
import { compareSync, hashSync } from "bcryptjs";

export type PasswordJob = {
  id: number;
  job: { act: "hash"; input: string; cost: number } | { act: "compare"; input: string; hash: string };
};
export type PasswordAnswer = { id: number; done: string | boolean };

parentPort?.on("message", ({ id, job }: PasswordJob) => {
  const done = job.act === "hash" ? hashSync(job.input, job.cost) : compareSync(job.input, job.hash);
  parentPort?.postMessage({ id, done } satisfies PasswordAnswer);
});

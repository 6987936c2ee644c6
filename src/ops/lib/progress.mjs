/**
 * Prints one line for each finished step: its name, seconds, and what it did.
 *
 * write    receives whole lines
 * now      clock in ms
 */
export function createProgress(write = (line) => process.stdout.write(`${line}\n`), now = () => performance.now()) {
  return {
    /** Runs `work`, which returns the words to print (or nothing) or `{ say, ...result }`. Passes its result on. */
    async step(name, work) {
      const start = now();
      const result = await work();
      write(stepLine(name, (now() - start) / 1000, typeof result === "string" ? result : result?.say));
      return result;
    },
    /** For what takes long: said before it starts. */
    say: write,
  };
}

export function stepLine(name, seconds, words = "") {
  return `  ${name.padEnd(12)} ${seconds.toFixed(1).padStart(6)} s  ${words}`.trimEnd();
}

/** A Ctrl-C reaches us twice, from the terminal and from npm, which passes on its own; only a later one is a second wish. */
const sameWishMs = 1500;

const numbers = { SIGHUP: 1, SIGINT: 2, SIGTERM: 15 };

/**
 * Ends the program on Ctrl-C, SIGTERM, a closed terminal, or the death of the npm that started us, after `stop` has ended everything.
 * A second signal does not wait: `stopNow`, then the end. The exit code is 128 plus the number of the signal.
 *
 * Returns  `{ stopping }`, true from the first signal on
 */
export function onStopSignals({ stop, stopNow, say }) {
  const state = { stopping: false };
  let since = 0;

  async function take(signal, words) {
    const exitCode = 128 + numbers[signal];
    if (state.stopping) {
      if (performance.now() - since < sameWishMs) return;
      stopNow();
      process.exit(exitCode);
    }
    state.stopping = true;
    since = performance.now();
    say(words);
    try {
      await stop();
    } finally {
      process.exit(exitCode);
    }
  }

  for (const signal of Object.keys(numbers)) process.on(signal, () => void take(signal, "Stopping …"));
  watchParent(() => void take("SIGTERM", "npm has gone away. Stopping …"));
  return state;
}

/** npm cannot pass on a kill -9 of its own; then nobody could reach us any more. */
function watchParent(gone) {
  if (process.env.npm_lifecycle_event === undefined) return;
  const parent = process.ppid;
  const timer = setInterval(() => {
    if (process.ppid === parent) return;
    clearInterval(timer);
    gone();
  }, 1000);
  timer.unref();
}

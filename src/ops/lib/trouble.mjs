/** An expected failure: one sentence that says what is wrong and what to do about it. It is printed without a stack. */
export class Trouble extends Error {
  name = "Trouble";
}

/** @type {Record<string, (path: string) => string>} */
const systemTroubles = {
  ENOSPC: (path) => `No space is left on the disk${path}. Free some, then run the command again.`,
  EDQUOT: (path) => `Your disk quota is used up${path}. Free some, then run the command again.`,
  EACCES: (path) => `Permission denied${path}. Run the command as the owner of that folder, or change its owner with chown.`,
  EPERM: (path) => `Not permitted${path}. Run the command as the owner of that folder, or change its owner with chown.`,
  EROFS: (path) => `The disk is read-only${path}. Work in a folder that can be written.`,
  EMFILE: () => "Too many files are open. Raise the limit (ulimit -n 4096), then run the command again.",
};

/**
 * Turns any failure into the one line that is printed for it.
 *
 * error    whatever was thrown
 * Returns  `{ line, expected }`; `expected` is false for a fault of ours, whose stack belongs into the log
 */
export function troubleLine(error) {
  if (error instanceof Trouble) return { line: oneLine(error.message), expected: true };
  const known = systemTroubles[error?.code];
  if (known) return { line: known(error.path ? ` (${error.path})` : ""), expected: true };
  return { line: `Unexpected failure: ${oneLine(String(error?.message ?? error))}`, expected: false };
}

function oneLine(text) {
  return text.replace(/\s*\n\s*/g, " ").trim();
}

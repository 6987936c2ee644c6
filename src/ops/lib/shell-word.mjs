/** A path as a person can paste it into a shell. */
export function shellWord(text) {
  return /^[\w./@:+-]+$/.test(text) ? text : `'${text.replaceAll("'", `'\\''`)}'`;
}

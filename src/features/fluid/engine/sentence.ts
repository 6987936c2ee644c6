/** The engine's own words, which begin small and end without a stop, as a sentence. */
export function sentence(words: string): string {
  const text = words.trim();
  return text === "" ? "" : `${text.charAt(0).toUpperCase()}${text.slice(1)}${/[.!?]$/.test(text) ? "" : "."}`;
}

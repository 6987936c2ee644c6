/**
 * Reads JSON text the strict way: a key that stands twice in one object is refused with its path, where JSON.parse would silently keep
 * the last one.
 */
export type JsonText = { ok: true; value: unknown } | { ok: false; path: string; message: string };

export function readJsonText(text: string): JsonText {
  let value: unknown;
  try {
    value = JSON.parse(text.charCodeAt(0) === 0xfeff ? text.slice(1) : text);
  } catch (error) {
    const why = error instanceof Error ? error.message : String(error);
    return { ok: false, path: "", message: `This is not valid JSON: ${why}. Correct the text and try again.` };
  }
  const twice = duplicateKey(text);
  return twice === undefined
    ? { ok: true, value }
    : { ok: false, path: twice, message: `The key stands twice. Keep one of the two, so that nobody has to guess which counts.` };
}

/** Path of the first key that an object holds twice. The text must already be known to be valid JSON. */
function duplicateKey(text: string): string | undefined {
  type Frame = { keys: Set<string> | undefined; path: string; index: number };
  const stack: Frame[] = [];
  let place = "";
  let expectKey = false;
  const tokens = /"(?:[^"\\]|\\.)*"|[{}[\],:]|[^\s{}[\],:"]+/g;
  for (let match = tokens.exec(text); match; match = tokens.exec(text)) {
    const token = match[0];
    const frame = stack.at(-1);
    if (token === "{" || token === "[") {
      stack.push({ keys: token === "{" ? new Set() : undefined, path: place, index: 0 });
      if (token === "[") place = `${place}[0]`;
      expectKey = token === "{";
    } else if (token === "}" || token === "]") {
      stack.pop();
      expectKey = false;
    } else if (token === ",") {
      if (frame?.keys) expectKey = true;
      else if (frame) place = `${frame.path}[${++frame.index}]`;
    } else if (expectKey && frame?.keys && token.startsWith('"')) {
      const key = JSON.parse(token) as string;
      place = frame.path === "" ? key : `${frame.path}.${key}`;
      if (frame.keys.has(key)) return place;
      frame.keys.add(key);
      expectKey = false;
    }
  }
  return undefined;
}

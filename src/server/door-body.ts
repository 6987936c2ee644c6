import "server-only";
import { readJsonText } from "@/contracts/json-text";
import { Refusal } from "./refusal";

export const largestBody = 256 * 1024;

/**
 * The JSON body of a request, counted while it comes in: what is larger than 256 KiB is dropped at that point, whatever the sender declared.
 * A key that stands twice is refused, because two readers could each see another value.
 */
export async function readBody(request: Request): Promise<unknown> {
  const type = request.headers.get("content-type") ?? "";
  if (!/^application\/json\s*(;\s*charset=utf-8\s*)?$/i.test(type)) throw new Refusal("unsupported-media-type");
  const declared = Number(request.headers.get("content-length") ?? 0);
  if (declared > largestBody) throw tooLarge();

  const chunks: Uint8Array[] = [];
  let size = 0;
  const reader = request.body?.getReader();
  while (reader) {
    const { done, value } = await reader.read();
    if (done) break;
    size += value.byteLength;
    if (size > largestBody) {
      await reader.cancel();
      throw tooLarge();
    }
    chunks.push(value);
  }
  const text = decode(Buffer.concat(chunks));
  const json = readJsonText(text);
  if (!json.ok) throw new Refusal("invalid-request", { problems: [{ path: json.path, message: json.message }] });
  return json.value;
}

function decode(bytes: Buffer): string {
  try {
    return new TextDecoder("utf-8", { fatal: true }).decode(bytes);
  } catch {
    throw new Refusal("invalid-request", { problems: [{ path: "", message: "The text is not UTF-8. Send it as UTF-8." }] });
  }
}

const tooLarge = () => new Refusal("too-large", { detail: `The limit is ${largestBody / 1024} KiB.` });

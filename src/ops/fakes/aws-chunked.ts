/**
 * Takes the payload out of a body in `aws-chunked` coding: chunks of `<hex length>[;extensions]\r\n<bytes>\r\n`, ended by a chunk of
 * length 0 and optional trailers.
 *
 * Source   Amazon S3 API reference, "Signature calculations for the Authorization header: transferring payload in multiple chunks"; from memory
 * Throws   Error when the body is cut short or a length is no hexadecimal number
 */
export function decodeAwsChunked(body: Buffer): Buffer {
  const parts: Buffer[] = [];
  for (let at = 0; ;) {
    const lineEnd = body.indexOf("\r\n", at);
    if (lineEnd < 0) throw new Error("aws-chunked body: no chunk length");
    const header = body.toString("latin1", at, lineEnd).split(";")[0] ?? "";
    if (!/^[0-9a-fA-F]{1,8}$/.test(header)) throw new Error("aws-chunked body: the chunk length is no hexadecimal number");
    const length = Number.parseInt(header, 16);
    if (length === 0) return Buffer.concat(parts);
    const start = lineEnd + 2;
    if (start + length + 2 > body.length) throw new Error("aws-chunked body: cut short");
    parts.push(body.subarray(start, start + length));
    at = start + length + 2;
  }
}

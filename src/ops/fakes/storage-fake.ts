import { createServer, type IncomingMessage, type ServerResponse } from "node:http";
import type { AddressInfo } from "node:net";
import { decodeAwsChunked } from "./aws-chunked";
import { errorXml, listObjectsXml } from "./list-objects-xml";
import { objectFiles, type StoredObject } from "./object-files";

const largestObjectBytes = 100_000_000;

class StorageError extends Error {
  constructor(
    readonly status: number,
    readonly code: string,
    message: string,
  ) {
    super(message);
  }
}

type Asked = { method: string; bucket: string; key: string; query: URLSearchParams; headers: IncomingMessage["headers"] };

/**
 * The part of the S3 interface that the product uses, over files: put (also `If-None-Match: *`), get, head, delete, list version 2.
 * It checks the access key but not the signature, so it is for the loopback only.
 *
 * folder       where objects are kept
 * accessKeyId  the one key that is let in
 * Returns      the endpoint, and `close`
 */
export async function startStorageFake(
  folder: string,
  accessKeyId: string,
): Promise<{ endpoint: string; close: () => Promise<void> }> {
  const files = objectFiles(folder);
  const server = createServer((request, response) => {
    answer(files, accessKeyId, request, response).catch((error: unknown) => refuse(response, error));
  });
  await new Promise<void>((ready, fail) => {
    server.once("error", fail);
    server.listen(0, "127.0.0.1", ready);
  });
  const { port } = server.address() as AddressInfo;
  return {
    endpoint: `http://127.0.0.1:${port}`,
    close: () =>
      new Promise((done) => {
        server.close(() => done());
        server.closeAllConnections();
      }),
  };
}

async function answer(
  files: ReturnType<typeof objectFiles>,
  accessKeyId: string,
  request: IncomingMessage,
  response: ServerResponse,
): Promise<void> {
  const asked = readRequest(request);
  const credential =
    /Credential=([^/,\s]+)\//.exec(request.headers.authorization ?? "")?.[1] ??
    asked.query.get("X-Amz-Credential")?.split("/")[0];
  if (credential !== accessKeyId) throw new StorageError(403, "InvalidAccessKeyId", "The access key is not known here.");
  if (!/^[a-z0-9][a-z0-9.-]{2,62}$/.test(asked.bucket))
    throw new StorageError(400, "InvalidBucketName", "The bucket has no valid name.");

  if (asked.key === "") return answerBucket(files, asked, response);
  if (asked.method === "PUT") return put(files, asked, await readBody(request), response);
  if (asked.method === "DELETE") {
    files.remove(asked.bucket, asked.key);
    response.writeHead(204).end();
    return;
  }
  if (asked.method !== "GET" && asked.method !== "HEAD")
    throw new StorageError(405, "MethodNotAllowed", `${asked.method} is not served here.`);
  const object = files.about(asked.bucket, asked.key);
  if (!object) throw new StorageError(404, "NoSuchKey", "The key does not exist.");
  response.writeHead(200, objectHeaders(object));
  response.end(asked.method === "GET" ? files.bytes(asked.bucket, asked.key) : undefined);
}

function readRequest(request: IncomingMessage): Asked {
  const url = new URL(request.url ?? "/", "http://localhost");
  const [, bucket = "", ...rest] = url.pathname.split("/").map(decodeURIComponent);
  return { method: request.method ?? "GET", bucket, key: rest.join("/"), query: url.searchParams, headers: request.headers };
}

function answerBucket(files: ReturnType<typeof objectFiles>, { method, bucket, query }: Asked, response: ServerResponse): void {
  if (method === "PUT" || method === "HEAD") {
    response.writeHead(200).end(); // buckets need no making
    return;
  }
  if (method !== "GET" || query.get("list-type") !== "2")
    throw new StorageError(501, "NotImplemented", "Only ListObjectsV2 is served for a bucket.");
  const prefix = query.get("prefix") ?? "";
  const maxKeys = Math.min(1000, Math.max(0, Number(query.get("max-keys") ?? 1000) || 0));
  const token = query.get("continuation-token");
  const after = token === null ? (query.get("start-after") ?? "") : Buffer.from(token, "base64url").toString("utf8");
  const xml = listObjectsXml(files.list(bucket, prefix), {
    bucket,
    prefix,
    delimiter: query.get("delimiter") ?? "",
    maxKeys,
    after,
  });
  response.writeHead(200, { "content-type": "application/xml" }).end(xml);
}

function put(
  files: ReturnType<typeof objectFiles>,
  { bucket, key, headers }: Asked,
  body: Buffer,
  response: ServerResponse,
): void {
  const chunked =
    (headers["content-encoding"] ?? "").includes("aws-chunked") ||
    String(headers["x-amz-content-sha256"] ?? "").startsWith("STREAMING-");
  const bytes = chunked ? decodeAwsChunked(body) : body;
  const metadata = Object.fromEntries(
    Object.entries(headers)
      .filter(([name]) => name.startsWith("x-amz-meta-"))
      .map(([name, value]) => [name, String(value)]),
  );
  const about = { contentType: headers["content-type"] ?? "application/octet-stream", metadata };
  const stored = files.put(bucket, key, bytes, about, headers["if-none-match"] === "*");
  if (!stored) throw new StorageError(412, "PreconditionFailed", "The key exists already.");
  response.writeHead(200, { etag: stored.etag }).end();
}

function objectHeaders({ size, modified, contentType, metadata, etag }: StoredObject): Record<string, string | number> {
  return { ...metadata, "content-length": size, "content-type": contentType, etag, "last-modified": modified.toUTCString() };
}

async function readBody(request: IncomingMessage): Promise<Buffer> {
  const chunks: Buffer[] = [];
  let length = 0;
  for await (const chunk of request) {
    length += (chunk as Buffer).length;
    if (length > largestObjectBytes) throw new StorageError(413, "EntityTooLarge", "The object is too large.");
    chunks.push(chunk as Buffer);
  }
  return Buffer.concat(chunks);
}

function refuse(response: ServerResponse, error: unknown): void {
  if (response.headersSent) {
    response.destroy();
    return;
  }
  const known =
    error instanceof StorageError
      ? error
      : new StorageError(400, "InvalidRequest", error instanceof Error ? error.message : String(error));
  response.writeHead(known.status, { "content-type": "application/xml" }).end(errorXml(known.code, known.message));
}

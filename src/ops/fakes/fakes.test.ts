import { mkdtempSync, readFileSync, readdirSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import {
  DeleteObjectCommand,
  GetObjectCommand,
  HeadObjectCommand,
  ListObjectsV2Command,
  PutObjectCommand,
  S3Client,
} from "@aws-sdk/client-s3";
import nodemailer from "nodemailer";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { decodeAwsChunked } from "./aws-chunked";
import { startMailFake, type StoredMail } from "./mail-fake";
import { startStorageFake } from "./storage-fake";

let folder: string;
beforeAll(() => void (folder = mkdtempSync(join(tmpdir(), "ebbmark-fakes-"))));
afterAll(() => rmSync(folder, { recursive: true }));

describe("the stand-in for object storage, spoken to by the real client", () => {
  const Bucket = "ebbmark";
  let fake: Awaited<ReturnType<typeof startStorageFake>>;
  let client: S3Client;

  const clientWith = (accessKeyId: string) =>
    new S3Client({
      endpoint: fake.endpoint,
      region: "local-1",
      forcePathStyle: true,
      credentials: { accessKeyId, secretAccessKey: "secret" },
      maxAttempts: 1,
    });

  beforeAll(async () => {
    fake = await startStorageFake(join(folder, "storage"), "the-key");
    client = clientWith("the-key");
  });
  afterAll(() => fake.close());

  it("gives back the bytes, type and metadata that were put, three megabytes of them", async () => {
    const body = Buffer.alloc(3_000_000, "ebb\r\n0\r\n");
    await client.send(
      new PutObjectCommand({
        Bucket,
        Key: "evidence/a b/Prüfung ≥ 3.pdf",
        Body: body,
        ContentType: "application/pdf",
        Metadata: { sha256: "ab" },
      }),
    );
    const got = await client.send(new GetObjectCommand({ Bucket, Key: "evidence/a b/Prüfung ≥ 3.pdf" }));
    expect(Buffer.from((await got.Body?.transformToByteArray()) ?? []).equals(body)).toBe(true);
    expect(got).toMatchObject({ ContentType: "application/pdf", ContentLength: 3_000_000, Metadata: { sha256: "ab" } });
  });

  it("refuses to write over an object when asked for a new one, even to twenty writers at once", async () => {
    const put = () => client.send(new PutObjectCommand({ Bucket, Key: "once", Body: "x", IfNoneMatch: "*" }));
    const ends = await Promise.allSettled(Array.from({ length: 20 }, put));
    const refused = ends
      .filter((end) => end.status === "rejected")
      .map((end) => (end.reason as { $metadata: { httpStatusCode: number } }).$metadata.httpStatusCode);
    expect(refused).toEqual(Array(19).fill(412));
  });

  it("answers for a key that is not there, before and after a removal", async () => {
    await expect(client.send(new GetObjectCommand({ Bucket, Key: "gone" }))).rejects.toMatchObject({ name: "NoSuchKey" });
    await client.send(new PutObjectCommand({ Bucket, Key: "gone", Body: "x" }));
    expect(await client.send(new HeadObjectCommand({ Bucket, Key: "gone" }))).toMatchObject({ ContentLength: 1 });
    await client.send(new DeleteObjectCommand({ Bucket, Key: "gone" }));
    await expect(client.send(new HeadObjectCommand({ Bucket, Key: "gone" }))).rejects.toMatchObject({ name: "NotFound" });
  });

  it("lists keys in order, page by page, and folds what lies deeper", async () => {
    for (const Key of ["l/b", "l/a", "l/é<&>", "l/deep/1", "l/deep/2", "m"])
      await client.send(new PutObjectCommand({ Bucket, Key, Body: "x" }));
    const keys: (string | undefined)[] = [];
    for (let token: string | undefined, more = true; more;) {
      const page = await client.send(new ListObjectsV2Command({ Bucket, Prefix: "l/", MaxKeys: 2, ContinuationToken: token }));
      keys.push(...(page.Contents ?? []).map(({ Key }) => Key));
      token = page.NextContinuationToken;
      more = page.IsTruncated ?? false;
    }
    expect(keys).toEqual(["l/a", "l/b", "l/deep/1", "l/deep/2", "l/é<&>"]);
    const folded = await client.send(new ListObjectsV2Command({ Bucket, Prefix: "l/", Delimiter: "/" }));
    expect([folded.CommonPrefixes, folded.Contents?.length]).toEqual([[{ Prefix: "l/deep/" }], 3]);
  });

  it("lets no other access key in, and no request without one", async () => {
    await expect(clientWith("another").send(new GetObjectCommand({ Bucket, Key: "once" }))).rejects.toMatchObject({
      name: "InvalidAccessKeyId",
    });
    expect((await fetch(`${fake.endpoint}/ebbmark/once`)).status).toBe(403);
  });

  it("keeps every key inside its folder", async () => {
    await client.send(new PutObjectCommand({ Bucket, Key: "../../escaped", Body: "x" }));
    expect(readdirSync(folder)).not.toContain("escaped");
    expect(readdirSync(join(folder, "storage"))).toEqual(["ebbmark"]);
  });
});

describe("decodeAwsChunked", () => {
  it("joins chunks and leaves out signatures and trailers", () => {
    const body = Buffer.from("5;chunk-signature=ab\r\nhello\r\n1\r\n!\r\n0\r\nx-amz-checksum-crc32:AAAA\r\n\r\n");
    expect(decodeAwsChunked(body).toString()).toBe("hello!");
  });

  it.each(["5\r\nhel", "zz\r\nhello\r\n0\r\n", "hello"])("refuses %j", (text) => {
    expect(() => decodeAwsChunked(Buffer.from(text))).toThrow(/aws-chunked body/);
  });
});

describe("the stand-in for mail", () => {
  it("writes each mail as received and as something to read", async () => {
    const fake = await startMailFake(join(folder, "mail"));
    const transport = nodemailer.createTransport(fake.url, { from: "Ebbmark <ebbmark@localhost>" });
    await transport.sendMail({
      to: "ada@demo.invalid",
      subject: "Für Sie: 85 °C ≥ −29 °C",
      text: "Line one\nLine two",
      html: "<p>Line</p>",
      messageId: "<one@ebbmark>",
    });
    transport.close();
    await fake.close();

    const [raw, read] = readdirSync(join(folder, "mail")).sort();
    expect(JSON.parse(readFileSync(join(folder, "mail", read as string), "utf8")) as StoredMail).toMatchObject({
      messageId: "<one@ebbmark>",
      to: ["ada@demo.invalid"],
      subject: "Für Sie: 85 °C ≥ −29 °C",
      text: "Line one\nLine two",
      html: "<p>Line</p>",
    });
    expect(readFileSync(join(folder, "mail", raw as string), "utf8")).toContain("Message-ID: <one@ebbmark>");
  });
});

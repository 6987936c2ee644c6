import { createHash, randomUUID } from "node:crypto";
import { linkSync, mkdirSync, readFileSync, readdirSync, renameSync, rmSync, statSync, writeFileSync } from "node:fs";
import { join } from "node:path";

export type StoredObject = {
  key: string;
  size: number;
  modified: Date;
  contentType: string;
  metadata: Record<string, string>;
  etag: string;
};

/**
 * Objects as files: `<bucket>/<SHA-256 of the key>` holds the bytes, the same name with `.json` what is known about them.
 * Naming files by a hash keeps any key, however strange, inside the folder.
 */
export function objectFiles(folder: string) {
  const place = (bucket: string, key: string) => join(folder, bucket, createHash("sha256").update(key).digest("hex"));

  return {
    /** Returns undefined when `onlyNew` and the key is taken; two writers at once cannot both succeed. */
    put(
      bucket: string,
      key: string,
      bytes: Buffer,
      about: Pick<StoredObject, "contentType" | "metadata">,
      onlyNew: boolean,
    ): StoredObject | undefined {
      mkdirSync(join(folder, bucket), { recursive: true, mode: 0o700 });
      const file = place(bucket, key);
      const etag = `"${createHash("md5").update(bytes).digest("hex")}"`;
      const draft = `${file}.${randomUUID()}`;
      writeFileSync(draft, bytes, { mode: 0o600 });
      try {
        if (onlyNew) linkSync(draft, file);
        else renameSync(draft, file);
      } catch (error) {
        if ((error as NodeJS.ErrnoException).code === "EEXIST") return undefined;
        throw error;
      } finally {
        rmSync(draft, { force: true });
      }
      writeFileSync(`${file}.json`, `${JSON.stringify({ key, etag, ...about })}\n`, { mode: 0o600 });
      return { key, etag, size: bytes.length, modified: new Date(), ...about };
    },

    about(bucket: string, key: string): StoredObject | undefined {
      return read(place(bucket, key));
    },

    bytes(bucket: string, key: string): Buffer {
      return readFileSync(place(bucket, key));
    },

    remove(bucket: string, key: string): void {
      const file = place(bucket, key);
      for (const path of [`${file}.json`, file]) rmSync(path, { force: true });
    },

    /** Every object of a bucket whose key has the prefix, in the order of UTF-8 bytes. */
    list(bucket: string, prefix: string): StoredObject[] {
      return namesIn(join(folder, bucket))
        .filter((name) => /^[0-9a-f]{64}$/.test(name))
        .map((name) => read(join(folder, bucket, name)))
        .filter((object): object is StoredObject => object !== undefined && object.key.startsWith(prefix))
        .sort((a, b) => Buffer.compare(Buffer.from(a.key), Buffer.from(b.key)));
    },
  };
}

function read(file: string): StoredObject | undefined {
  try {
    const { size, mtime } = statSync(file);
    return { ...(JSON.parse(readFileSync(`${file}.json`, "utf8")) as StoredObject), size, modified: mtime };
  } catch {
    return undefined; // not there, or still being written
  }
}

function namesIn(folder: string): string[] {
  try {
    return readdirSync(folder);
  } catch {
    return [];
  }
}

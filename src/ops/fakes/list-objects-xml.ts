import type { StoredObject } from "./object-files";

export type ListQuery = { bucket: string; prefix: string; delimiter: string; maxKeys: number; after: string };

/**
 * One page of ListObjectsV2: keys after `after`, those that share the part up to the delimiter folded into common prefixes.
 * The token for the next page is the last key of this one, in base64url.
 */
export function listObjectsXml(all: StoredObject[], { bucket, prefix, delimiter, maxKeys, after }: ListQuery): string {
  const contents: StoredObject[] = [];
  const prefixes: string[] = [];
  let last = "";
  let truncated = false;
  for (const object of all.filter(({ key }) => after === "" || Buffer.compare(Buffer.from(key), Buffer.from(after)) > 0)) {
    const cut = delimiter === "" ? -1 : object.key.indexOf(delimiter, prefix.length);
    const folded = cut < 0 ? undefined : object.key.slice(0, cut + delimiter.length);
    const isNew = folded === undefined || prefixes.at(-1) !== folded;
    if (isNew && contents.length + prefixes.length >= maxKeys) {
      truncated = true;
      break;
    }
    if (folded === undefined) contents.push(object);
    else if (isNew) prefixes.push(folded);
    last = object.key;
  }
  const items = contents.map(
    ({ key, size, modified, etag }) =>
      `<Contents><Key>${escapeXml(key)}</Key><LastModified>${modified.toISOString()}</LastModified><ETag>${escapeXml(etag)}</ETag><Size>${size}</Size><StorageClass>STANDARD</StorageClass></Contents>`,
  );
  const common = prefixes.map((value) => `<CommonPrefixes><Prefix>${escapeXml(value)}</Prefix></CommonPrefixes>`);
  const token = truncated ? `<NextContinuationToken>${Buffer.from(last).toString("base64url")}</NextContinuationToken>` : "";
  return `<?xml version="1.0" encoding="UTF-8"?>
<ListBucketResult xmlns="http://s3.amazonaws.com/doc/2006-03-01/"><Name>${escapeXml(bucket)}</Name><Prefix>${escapeXml(prefix)}</Prefix><KeyCount>${contents.length + prefixes.length}</KeyCount><MaxKeys>${maxKeys}</MaxKeys><IsTruncated>${truncated}</IsTruncated>${token}${items.join("")}${common.join("")}</ListBucketResult>`;
}

export function errorXml(code: string, message: string): string {
  return `<?xml version="1.0" encoding="UTF-8"?>\n<Error><Code>${code}</Code><Message>${escapeXml(message)}</Message></Error>`;
}

function escapeXml(text: string): string {
  return text.replace(/[<>&"']/g, (sign) => `&#${sign.charCodeAt(0)};`);
}

import { createHash } from "node:crypto";
import { existsSync, readFileSync, readdirSync, statSync } from "node:fs";
import { join, relative } from "node:path";

/**
 * SHA-256 over names and contents of files, so that any edit, addition, removal or renaming changes it. Times do not count.
 *
 * base     folder that names are relative to
 * paths    files and folders; one that is not there counts as such
 * skip     says of a path (relative to base) that it does not matter
 * Returns  64 hex digits
 */
export function hashFiles(base, paths, skip = () => false) {
  const hash = createHash("sha256");
  for (const file of paths
    .flatMap((path) => listFiles(base, join(base, path)))
    .filter((file) => !skip(file))
    .sort()) {
    const content = readFileSync(join(base, file));
    hash.update(`${Buffer.byteLength(file)}:${file}${content.length}:`).update(content);
  }
  return hash.digest("hex");
}

function listFiles(base, path) {
  if (!existsSync(path)) return [];
  if (statSync(path).isFile()) return [relative(base, path)];
  return readdirSync(path, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => relative(base, join(entry.parentPath, entry.name)));
}

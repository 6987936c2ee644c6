import { existsSync, readFileSync, readdirSync } from "node:fs";
import { dirname, join, relative, resolve } from "node:path";
import { describe, expect, it } from "vitest";

/** A document that names a path of this project is wrong when the path is gone. */
const root = resolve(import.meta.dirname, "..");

const documents = [
  "README.md",
  "DEVELOPERS.md",
  ...readdirSync(join(root, "docs"), { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && entry.name.endsWith(".md"))
    .map((entry) => relative(root, join(entry.parentPath, entry.name))),
].filter((file) => existsSync(join(root, file)));

const pathPattern = /`((?:src|db|drizzle|docs|tests|fonts|public|\.ci)\/[\w./()[\]-]+)`/g;
const linkPattern = /\]\((?!https?:|mailto:|#)([^)#\s]+)/g;

describe("the documents", () => {
  it("exist", () => expect(documents).toEqual(expect.arrayContaining(["README.md", "DEVELOPERS.md", "docs/architecture.md"])));

  it.each(documents)("%s names only paths that are there", (document) => {
    const text = readFileSync(join(root, document), "utf8").replace(/```[\s\S]*?```/g, "");
    const paths = [...text.matchAll(pathPattern)].map((match) => match[1] as string);
    const links = [...text.matchAll(linkPattern)].map((match) =>
      relative(root, resolve(root, dirname(document), match[1] as string)),
    );
    expect([...paths, ...links].filter((path) => !existsSync(join(root, path)))).toEqual([]);
  });
});

import { readFileSync, readdirSync } from "node:fs";
import { join, relative, resolve, sep } from "node:path";
import { describe, expect, it } from "vitest";
import type { Handler } from "@/server/door";
import { apiAddresses, pageAddresses } from "./addresses";

const app = resolve(import.meta.dirname, "../../app");
const files = (name: RegExp): string[] =>
  readdirSync(app, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && name.test(entry.name))
    .map((entry) => join(entry.parentPath, entry.name));

/** Address of a file below src/app; folders in round brackets group files and are no part of it. */
const addressOf = (file: string): string =>
  `/${relative(app, file)
    .split(sep)
    .slice(0, -1)
    .filter((part) => !part.startsWith("("))
    .join("/")}`;

const methods = ["GET", "HEAD", "POST", "PUT", "PATCH", "DELETE", "OPTIONS"];

describe("the addresses of the API", () => {
  const routes = files(/^route\.tsx?$/);

  it("are all listed, and each list line has its file", () => {
    expect(routes.map(addressOf).sort()).toEqual(Object.keys(apiAddresses).sort());
  });

  it.each(routes.map((file) => [addressOf(file), file]))("%s asks for the acts it is listed with", async (address, file) => {
    const exported = (await import(file)) as Record<string, Handler>;
    const asked = Object.fromEntries(
      Object.keys(exported)
        .filter((name) => methods.includes(name))
        .map((name) => [name, exported[name]?.acts]),
    );
    expect(asked).toEqual(apiAddresses[address]);
  });
});

describe("the pages", () => {
  const pages = files(/^page\.tsx$/);

  it("are all listed", () => {
    expect(pages.map(addressOf).filter((address) => !(address in pageAddresses))).toEqual([]);
  });

  it.each(pages.map((file) => [addressOf(file), file]))("%s lets nobody in whom its listing does not", (address, file) => {
    if (pageAddresses[address] === "open") return;
    expect(readFileSync(file, "utf8")).toMatch(/await requireViewer\(/);
  });

  it("have no other door: no server action anywhere", () => {
    const source = resolve(app, "..");
    const acting = readdirSync(source, { recursive: true, withFileTypes: true })
      .filter((entry) => entry.isFile() && /\.tsx?$/.test(entry.name) && !entry.name.includes(".test."))
      .map((entry) => join(entry.parentPath, entry.name))
      .filter((file) => /^\s*["']use server["']/m.test(readFileSync(file, "utf8")));
    expect(acting).toEqual([]);
  });
});

import { readFileSync, readdirSync } from "node:fs";
import { dirname, join, normalize, relative, resolve } from "node:path";
import { describe, expect, it } from "vitest";

/**
 * Reads the imports of every source file and holds them against the table of layers. The lint rules say the same while typing; this test
 * also sees relative paths, and finds circles.
 */
const root = resolve(import.meta.dirname, "..");

type Layer = { name: string; holds: string; may: string[]; packages: RegExp };

const anyPackage = /^/;
const layers: Layer[] = [
  { name: "engine", holds: "src/engine/", may: ["engine"], packages: /^odex$/ },
  { name: "ledger", holds: "src/ledger/", may: ["ledger"], packages: /^(@noble\/hashes\/.+\.js|canonicalize)$/ },
  { name: "contracts", holds: "src/contracts/", may: ["contracts", "engine"], packages: /^zod$/ },
  {
    name: "components",
    holds: "src/components/",
    may: ["components", "contracts", "engine"],
    packages: /^(?!node:|pg|drizzle|iron-session|bcryptjs|server-only)/,
  },
  {
    name: "features",
    holds: "src/features/",
    may: ["features", "components", "contracts", "engine", "ledger", "workers"],
    packages: /^(?!node:|pg|drizzle|iron-session|bcryptjs|server-only)/,
  },
  { name: "workers", holds: "src/workers/", may: ["workers", "engine", "contracts", "ledger"], packages: anyPackage },
  {
    name: "server",
    holds: "src/server/",
    may: ["server", "contracts", "engine", "ledger", "db"],
    packages: /^(?!react|chart\.js|formik)/,
  },
  {
    name: "app",
    holds: "src/app/",
    may: ["app", "features", "components", "contracts", "server", "engine", "ledger"],
    packages: /^(?!pg|drizzle)/,
  },
  { name: "cli", holds: "src/cli/", may: ["cli", "ops", "verifier"], packages: anyPackage },
  { name: "ops", holds: "src/ops/", may: ["ops", "server", "contracts", "db", "engine", "ledger"], packages: anyPackage },
  { name: "db", holds: "db/", may: ["db", "server", "contracts"], packages: anyPackage },
];

const files = ["src", "db"]
  .flatMap((top) => readdirSync(join(root, top), { recursive: true, withFileTypes: true }))
  .filter((entry) => entry.isFile() && /\.(ts|tsx|mjs)$/.test(entry.name) && !/\.(test|bench)\.tsx?$|\.d\.ts$/.test(entry.name))
  .map((entry) => relative(root, join(entry.parentPath, entry.name)));

const importPattern =
  /(?:^|[^\w.])(?:import|export)\s+(?:type\s+)?(?:[\w*{}\s,$]+\sfrom\s+)?["']([^"']+)["']|import\(\s*["']([^"']+)["']\s*\)/g;

type Import = { from: string; to: string; typeOnly: boolean };

function importsOf(file: string): Import[] {
  const text = readFileSync(join(root, file), "utf8").replace(/\/\*[\s\S]*?\*\//g, "");
  return [...text.matchAll(importPattern)].map((match) => ({
    from: file,
    to: target(file, (match[1] ?? match[2]) as string),
    typeOnly: /(import|export)\s+type\s/.test(match[0]),
  }));
}

function target(file: string, specifier: string): string {
  if (specifier.startsWith("@/")) return `src/${specifier.slice(2)}`;
  if (specifier.startsWith("@db/")) return `db/${specifier.slice(4)}`;
  if (specifier.startsWith(".")) return normalize(join(dirname(file), specifier));
  return specifier;
}

const isOurs = (path: string) => /^(src|db|drizzle|fonts|public|package\.json)/.test(path);
const layerOf = (path: string) => layers.find((layer) => path.startsWith(layer.holds));
const all = files.flatMap(importsOf);

describe("the layers", () => {
  it("hold every source file but the proxy, which Next.js wants at the top", () => {
    expect(files.filter((file) => !layerOf(file) && !file.startsWith("src/verifier/"))).toEqual(
      files.filter((file) => file === "src/proxy.ts"),
    );
  });

  it.each(layers)("$name imports only what it may", (layer) => {
    const wrong = all
      .filter(({ from }) => from.startsWith(layer.holds))
      .filter(({ to }) => {
        if (!isOurs(to)) return !layer.packages.test(to);
        const other = layerOf(to);
        return other !== undefined && !layer.may.includes(other.name);
      })
      .map(({ from, to }) => `${from} imports ${to}`);
    expect(wrong).toEqual([]);
  });

  it("let no feature reach into another, save the shared fetch helpers", () => {
    const feature = (path: string) => /^src\/features\/([^/]+)\//.exec(path)?.[1];
    const wrong = all
      .filter(({ from, to }) => feature(from) && feature(to) && feature(from) !== feature(to) && feature(to) !== "query")
      .map(({ from, to }) => `${from} imports ${to}`);
    expect(wrong).toEqual([]);
  });

  it("open every server file with the guard that keeps it out of the browser", () => {
    const unguarded = files
      .filter((file) => file.startsWith("src/server/") && file.endsWith(".ts"))
      .filter((file) => !/^(\/\*[\s\S]*?\*\/\s*)?import "server-only";/.test(readFileSync(join(root, file), "utf8")));
    expect(unguarded).toEqual([]);
  });
});

describe("the import graph", () => {
  it("has no circle", () => {
    const known = new Map(files.flatMap((file) => [file, file.replace(/\.(tsx?|mjs)$/, "")].map((key) => [key, file] as const)));
    const edges = new Map<string, string[]>();
    for (const { from, to, typeOnly } of all) {
      const file = known.get(to);
      if (file && !typeOnly) edges.set(from, [...(edges.get(from) ?? []), file]);
    }
    expect(circles(edges)).toEqual([]);
  });
});

function circles(edges: Map<string, string[]>): string[] {
  const found: string[] = [];
  const state = new Map<string, "open" | "done">();
  const visit = (file: string, trail: string[]): void => {
    if (state.get(file) === "done") return;
    if (state.get(file) === "open") {
      found.push([...trail.slice(trail.indexOf(file)), file].join(" → "));
      return;
    }
    state.set(file, "open");
    for (const next of edges.get(file) ?? []) visit(next, [...trail, file]);
    state.set(file, "done");
  };
  for (const file of edges.keys()) visit(file, []);
  return found;
}

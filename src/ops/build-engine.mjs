// Bundles the engine into one self-contained module, named by its hash:
//
//   <engines>/<sha256>.mjs      the bundle; earlier ones stay, so that an old record can be run again with the engine that made it
//   <engines>/current.json      { "file", "sha256", "engineVersion", "sources" }
//
// The same sources give the same bytes. Nothing is rebuilt while the hash over package version and sources is unchanged.
// Usage: node src/ops/build-engine.mjs   (folder from EBBMARK_ENGINE_DIR, else .ebbmark/engines of the checkout)
import { createHash } from "node:crypto";
import { existsSync, readdirSync, readFileSync } from "node:fs";
import { mkdir, readFile, rename, writeFile } from "node:fs/promises";
import { join, relative, sep } from "node:path";
import { fileURLToPath, pathToFileURL } from "node:url";

export const root = fileURLToPath(new URL("../..", import.meta.url));
export const enginesFolder = () => process.env.EBBMARK_ENGINE_DIR || join(root, ".ebbmark", "engines");

const sourceFolders = ["src/engine", "src/contracts"];
const sourceFiles = ["src/workers/engine-entry.ts", "package-lock.json", "tsconfig.json"];

/** Builds if needed. Returns { file, engineVersion }. */
export async function buildEngine(folder = enginesFolder()) {
  const { version } = JSON.parse(await readFile(join(root, "package.json"), "utf8"));
  const sources = sourcesHash();
  const current = await readCurrent(folder);
  if (current && current.sources === sources && existsSync(join(folder, current.file))) {
    return { file: join(folder, current.file), engineVersion: current.engineVersion };
  }
  const bytes = await bundle();
  const sha256 = createHash("sha256").update(bytes).digest("hex");
  const engineVersion = `${version}+${sha256.slice(0, 16)}`;
  await mkdir(folder, { recursive: true });
  await replaceFile(join(folder, `${sha256}.mjs`), bytes);
  await replaceFile(
    join(folder, "current.json"),
    `${JSON.stringify({ file: `${sha256}.mjs`, sha256, engineVersion, sources }, null, 1)}\n`,
  );
  return { file: join(folder, `${sha256}.mjs`), engineVersion };
}

async function bundle() {
  const { build } = await import("esbuild");
  const { outputFiles } = await build({
    absWorkingDir: root,
    entryPoints: ["src/workers/engine-entry.ts"],
    bundle: true,
    format: "esm",
    platform: "neutral",
    mainFields: ["module", "main"],
    conditions: ["import", "default"],
    target: "es2022",
    charset: "utf8",
    legalComments: "inline",
    write: false,
    logLevel: "silent",
  });
  return Buffer.from(outputFiles[0].contents);
}

function sourcesHash() {
  const hash = createHash("sha256");
  const files = [...sourceFolders.flatMap((folder) => walk(join(root, folder))), ...sourceFiles.map((file) => join(root, file))];
  for (const file of files.sort()) {
    if (!existsSync(file)) continue;
    hash.update(relative(root, file).split(sep).join("/")).update("\0").update(readFileSync(file)).update("\0");
  }
  return hash.digest("hex");
}

function walk(folder) {
  return readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
    const path = join(folder, entry.name);
    if (entry.isDirectory()) return walk(path);
    return /\.(test|bench|checks)\.tsx?$/.test(entry.name) ? [] : [path];
  });
}

async function readCurrent(folder) {
  try {
    return JSON.parse(await readFile(join(folder, "current.json"), "utf8"));
  } catch {
    return undefined;
  }
}

/** Two builds at once end with one whole file, never with half of one. */
async function replaceFile(path, content) {
  const draft = `${path}.${process.pid}.part`;
  await writeFile(draft, content);
  await rename(draft, path);
}

if (process.argv[1] && import.meta.url === pathToFileURL(process.argv[1]).href) {
  const { file, engineVersion } = await buildEngine();
  process.stdout.write(`engine ${engineVersion} in ${relative(process.cwd(), file) || file}\n`);
}

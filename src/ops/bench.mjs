// Measures the engine: bundles tests/bench/measure.ts and runs it in a process of its own. Usage: npm run bench -- [repeats]
import { spawn } from "node:child_process";
import { mkdir } from "node:fs/promises";
import { join } from "node:path";
import { build } from "esbuild";
import { root } from "./build-engine.mjs";

const folder = join(root, ".ebbmark", "bench");
const outfile = join(folder, "measure.mjs");
await mkdir(folder, { recursive: true });
await build({
  absWorkingDir: root,
  entryPoints: ["tests/bench/measure.ts"],
  outfile,
  bundle: true,
  format: "esm",
  platform: "node",
  target: "node20",
  logLevel: "error",
});
const child = spawn(process.execPath, [outfile, ...process.argv.slice(2)], { stdio: "inherit" });
child.on("exit", (code, signal) => {
  process.exitCode = code ?? (signal ? 1 : 0);
});

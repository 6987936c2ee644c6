import { build } from "esbuild";
import { existsSync } from "node:fs";
import { join } from "node:path";
import { threads } from "./lib/build-engine-files.mjs";
import { root } from "./lib/places.mjs";

/**
 * Bundles each worker thread of the server into one file in EBBMARK_ENGINE_DIR. A process of its own, since the compiler's helper would
 * otherwise hear a Ctrl-C before we do.
 */
await build({
  absWorkingDir: root,
  entryPoints: Object.values(threads)
    .map((name) => `src/workers/${name}.ts`)
    .filter((file) => existsSync(join(root, file))),
  outdir: process.env.EBBMARK_ENGINE_DIR,
  outExtension: { ".js": ".mjs" },
  bundle: true,
  platform: "node",
  format: "esm",
  target: "node20",
  conditions: ["react-server"],
  // Packages in the older module format call `require` for what Node.js has built in.
  banner: { js: 'import { createRequire } from "node:module"; const require = createRequire(import.meta.url);' },
  logLevel: "warning",
});

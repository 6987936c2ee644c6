#!/usr/bin/env node
// The command line: case files in, result documents out. Nothing but documents is ever printed on standard output.
import { readFile } from "node:fs/promises";
import { pathToFileURL } from "node:url";
import { buildEngine } from "../ops/build-engine.mjs";

const help = `Usage:
  ebbmark run CASE.json            one result document on standard output
  ebbmark run -                    the case on standard input
  ebbmark run A.json B.json …      one document a line, in order
  ebbmark methods                  the published methods of the kind "method", one JSON object a line
  ebbmark --help

Exit status: 0 computed; 2 the case is invalid; 3 it is valid but cannot be computed; 1 the command itself went wrong.
With several files it is the highest of them. The case format is described in docs/case-format.md.
`;

async function main([command, ...files]) {
  if (command === "--help" || command === "-h" || command === "help") {
    process.stderr.write(help);
    return 0;
  }
  if (command === "methods" && files.length === 0) {
    const engine = await loadEngine();
    for (const method of engine.module.describeMethods()) await print(`${JSON.stringify(method)}\n`);
    return 0;
  }
  if (command !== "run" || files.length === 0 || files.some((file) => file.startsWith("-") && file !== "-")) {
    process.stderr.write(help);
    return 1;
  }
  const { module: engine, engineVersion } = await loadEngine();
  let highest = 0;
  for (const source of files) {
    const outcome = await runOne(engine, source, engineVersion);
    highest = Math.max(highest, outcome.status);
    const document = outcome.status === 0 ? outcome.result : outcome.error;
    await print(`${files.length > 1 ? JSON.stringify(document) : JSON.stringify(document, null, 1)}\n`);
  }
  return highest;
}

async function loadEngine() {
  const { file, engineVersion } = await buildEngine();
  return { module: await import(pathToFileURL(file).href), engineVersion };
}

async function runOne(engine, source, engineVersion) {
  let text;
  try {
    text = source === "-" ? await readStandardInput() : await readFile(source, "utf8");
  } catch (error) {
    const message = `The file ${source} cannot be read (${error.code ?? error.message}). Check its name and permissions.`;
    return { status: 2, error: { format: "ebbmark-error/1", code: "invalid-case", problems: [{ path: "", message }] } };
  }
  return engine.runText(text, { engineVersion, now: () => performance.now() });
}

async function readStandardInput() {
  const chunks = [];
  for await (const chunk of process.stdin) chunks.push(chunk);
  return Buffer.concat(chunks).toString("utf8");
}

/** A reader that closes early (`| head`) is no fault of the calculation. */
function print(text) {
  return new Promise((resolve, reject) =>
    process.stdout.write(text, (error) => (error && error.code !== "EPIPE" ? reject(error) : resolve())),
  );
}

process.stdout.on("error", (error) => {
  if (error.code !== "EPIPE") throw error;
});

try {
  process.exitCode = await main(process.argv.slice(2));
} catch (error) {
  process.stderr.write(`ebbmark: ${error.stack ?? error}\n`);
  process.exitCode = 1;
}

// Read by any Node.js that is old enough to be refused: no newer syntax, no `node:` names, no imports of ours.
import { readFileSync } from "fs";

/** Ends the program with one line when Node.js is older than package.json asks for. */
export function checkNode() {
  const wanted = JSON.parse(readFileSync(new URL("../../../package.json", import.meta.url), "utf8")).engines.node;
  const lowest = wanted.replace(/^>=/, "");
  if (reaches(process.versions.node, lowest)) return;
  console.error(
    "ebbmark: Node.js " + process.versions.node + " is too old. Install " + lowest + " or newer, then run the command again.",
  );
  process.exit(1);
}

/** True when version `have` (as "20.19.1") is at least `need` (as "20.19"). A part that is not written counts as 0. */
export function reaches(have, need) {
  const a = have.split(".").map(Number);
  const b = need.split(".").map(Number);
  for (let i = 0; i < 3; i++) {
    const difference = (a[i] || 0) - (b[i] || 0);
    if (difference !== 0) return difference > 0;
  }
  return true;
}

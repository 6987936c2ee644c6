import { existsSync, statfsSync } from "node:fs";
import { join } from "node:path";
import { Trouble } from "./trouble.mjs";

/** What a start still has to write, measured on a fresh clone and rounded up. */
const needs = [
  { part: "node_modules", megabytes: 1200 },
  { part: ".ebbmark/builds", megabytes: 600 }, // one build and the cache of its compiler
  { part: ".ebbmark/cluster", megabytes: 150 },
];
const alwaysMegabytes = 100;

/** Refuses to begin on a disk that the missing parts would fill up. */
export function checkDisk(root, freeBytes = freeBytesAt(root)) {
  const needed = needs
    .filter(({ part }) => !existsSync(join(root, part)))
    .reduce((sum, { megabytes }) => sum + megabytes, alwaysMegabytes);
  const free = Math.floor(freeBytes / 1e6);
  if (free < needed) {
    throw new Trouble(
      `Only ${free} MB are free on the disk of ${root}, and ${needed} MB are needed. Free some, then run the command again.`,
    );
  }
}

function freeBytesAt(folder) {
  const { bavail, bsize } = statfsSync(folder);
  return bavail * bsize;
}

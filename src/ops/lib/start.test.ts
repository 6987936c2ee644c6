import { mkdirSync, mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { checkDisk } from "./check-disk.mjs";
import { reaches } from "./check-node.mjs";
import { matchesLock } from "./install-packages.mjs";
import { choosePostgres } from "./postgres-binaries.mjs";
import { stepLine } from "./progress.mjs";
import { lastJsonLine, lastWords } from "./scripts.mjs";
import { readSecrets } from "./secrets.mjs";
import { shellWord } from "./shell-word.mjs";
import { takeLock } from "./single-start.mjs";
import { abandonedHomes } from "./test-home.mjs";
import { Trouble, troubleLine } from "./trouble.mjs";
import { welcomeLines } from "./welcome.mjs";
import { placesOf } from "./places.mjs";

let base: string;
beforeEach(() => (base = mkdtempSync(join(tmpdir(), "ebbmark-start-"))));
afterEach(() => rmSync(base, { recursive: true }));

describe("the version of Node.js", () => {
  it.each([
    ["20.19.0", true],
    ["20.20.2", true],
    ["22.0.0", true],
    ["20.9.0", false],
    ["18.20.0", false],
  ])("%s reaches 20.19: %s", (have, answer) => {
    // prettier-ignore
    expect(reaches(have, "20.19")).toBe(answer);
  });
});

describe("checkDisk", () => {
  it("asks for room for what is missing, and for less once it is there", () => {
    expect(() => checkDisk(base, 1.5e9)).toThrow(/^Only 1500 MB are free on the disk of .*, and 2050 MB are needed/);
    for (const folder of ["node_modules", ".ebbmark/builds", ".ebbmark/cluster"])
      mkdirSync(join(base, folder), { recursive: true });
    expect(() => checkDisk(base, 1.5e9)).not.toThrow();
    expect(() => checkDisk(base, 5e7)).toThrow(/Only 50 MB/);
  });
});

it("writes a path so that it can be pasted", () => {
  expect([shellWord("/a/b-1.x"), shellWord("/a b/it's")]).toEqual(["/a/b-1.x", `'/a b/it'\\''s'`]);
});

describe("matchesLock", () => {
  const wanted = {
    packages: { "": {}, "node_modules/a": { version: "1.0.0" }, "node_modules/b": { version: "2.0.0", optional: true } },
  };
  it.each([
    ["all is there", { "node_modules/a": { version: "1.0.0" }, "node_modules/b": { version: "2.0.0" } }, true],
    ["a package for another system is not there", { "node_modules/a": { version: "1.0.0" } }, true],
    ["a version differs", { "node_modules/a": { version: "1.0.1" } }, false],
    ["a package is not there", { "node_modules/b": { version: "2.0.0" } }, false],
    ["there is one too many", { "node_modules/a": { version: "1.0.0" }, "node_modules/c": { version: "1.0.0" } }, false],
  ])("when %s", (_, packages, answer) => expect(matchesLock(wanted, { packages })).toBe(answer));

  it("is false when an install was broken off", () => expect(matchesLock(wanted, undefined)).toBe(false));
});

describe("choosePostgres", () => {
  const servers = [
    { bin: "/17", major: 17 },
    { bin: "/15", major: 15 },
  ];

  it("takes the newest for a new cluster, and the one that made an old one", () => {
    expect(choosePostgres(servers, base)?.major).toBe(17);
    writeFileSync(join(base, "PG_VERSION"), "15\n");
    expect(choosePostgres(servers, base)?.major).toBe(15);
  });

  it("refuses a cluster whose server is gone, and names the package", () => {
    writeFileSync(join(base, "PG_VERSION"), "16\n");
    expect(() => choosePostgres(servers, base)).toThrow(
      /made by PostgreSQL 16, which is not installed: apt-get install postgresql-16/,
    );
  });
});

describe("readSecrets", () => {
  it("makes them once, for the owner's eyes only, and keeps them", () => {
    const first = readSecrets(base, { haveData: false });
    expect(new Set(Object.values(first)).size).toBe(9);
    expect(Object.values(first).every((secret) => (secret as string).length === 43)).toBe(true);
    expect(statSync(join(base, "secrets.json")).mode & 0o777).toBe(0o600);
    expect(readSecrets(base, { haveData: true })).toEqual(first);
  });

  it("does not make new ones over a damaged file", () => {
    writeFileSync(join(base, "secrets.json"), '{"sessionSecret": "abc');
    expect(() => readSecrets(base, { haveData: false })).toThrow(/secrets\.json is damaged/);
    expect(readFileSync(join(base, "secrets.json"), "utf8")).toBe('{"sessionSecret": "abc');
  });
});

describe("takeLock", () => {
  it("is held until released, and tells who holds it", () => {
    const file = join(base, "up.lock");
    const held = takeLock(file, { port: 3000 });
    expect(takeLock(file).heldBy).toMatchObject({ pid: process.pid, port: 3000 });
    held.release?.();
    expect(takeLock(file).heldBy).toBeUndefined();
  });

  it.each(['{"pid":1,"identity":"another boot/1"}', '{"pid":', ""])("is taken over from a holder that is gone: %j", (left) => {
    writeFileSync(join(base, "up.lock"), left);
    expect(takeLock(join(base, "up.lock")).heldBy).toBeUndefined();
  });
});

it("finds the homes of test runs that were killed, and no other folder", () => {
  for (const name of ["test-1", "test-2", "test-reports", "cluster"]) mkdirSync(join(base, name));
  const { release } = takeLock(join(base, "test-2/holder.json"));
  expect(abandonedHomes(base)).toEqual([join(base, "test-1")]);
  release?.();
});

describe("troubleLine", () => {
  it("says what to do about a full disk and a missing permission", () => {
    expect(troubleLine(Object.assign(new Error("x"), { code: "ENOSPC", path: "/a" })).line).toBe(
      "No space is left on the disk (/a). Free some, then run the command again.",
    );
    expect(troubleLine(Object.assign(new Error("x"), { code: "EACCES", path: "/a" })).line).toMatch(
      /^Permission denied \(\/a\)\. .*chown/,
    );
  });

  it("is one line, and tells a fault of ours from what was foreseen", () => {
    expect(troubleLine(new Trouble("a\n  b"))).toEqual({ line: "a b", expected: true });
    expect(troubleLine(new TypeError("x is not a function"))).toEqual({
      line: "Unexpected failure: x is not a function",
      expected: false,
    });
  });
});

describe("what a script printed", () => {
  it("gives its message, not the stack below it", () => {
    expect(lastWords("starting\nError: The file 0001 was edited\n    at x (y.ts:1)\n\nNode.js v20.20.2\n")).toBe(
      "Error: The file 0001 was edited.",
    );
    expect(lastWords('Error: Build failed with 1 error:\nsrc/a.ts:6:31: ERROR: Could not resolve "./b"\n  at x')).toBe(
      'src/a.ts:6:31: ERROR: Could not resolve "./b".',
    );
    expect(lastWords("migrate: no answer\n")).toBe("migrate: no answer.");
    expect(lastWords("")).toBe("no reason given.");
  });

  it("gives the last JSON line that holds the member asked for", () => {
    expect(lastJsonLine('{"accounts":[1]}\n{"level":30}\n{broken\nend', "accounts")).toEqual({ accounts: [1] });
    expect(lastJsonLine("nothing", "accounts")).toBeUndefined();
  });
});

describe("what stands at the end of a start", () => {
  const places = placesOf("/x");
  const accounts = [{ role: "engineer", badge: "E-1", password: "pass words", printedName: "E. Person" }];

  it("is the address, the accounts, and where mail and files land", () => {
    const text = welcomeLines({ port: 3001, accounts, places }).join("\n");
    expect(text).toContain("http://localhost:3001");
    expect(text).toContain("E-1         pass words  engineer  E. Person");
    expect(text).toMatch(/Mail is written to.*mail\/[\s\S]*Files are kept in.*storage\//);
  });

  it("shows no password when no demo is loaded", () => {
    expect(welcomeLines({ port: 3001, accounts: undefined, places }).join("\n")).not.toMatch(/account|password/i);
  });
});

it("prints a step as one line with its seconds", () =>
  expect(stepLine("database", 1.26, "ready")).toBe("  database        1.3 s  ready"));

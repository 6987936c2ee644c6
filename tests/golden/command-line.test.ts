// The command line as a person meets it: its own process, real files, real exit statuses.
import { spawnSync } from "node:child_process";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import { afterAll, beforeAll, describe, expect, it } from "vitest";

const root = fileURLToPath(new URL("../..", import.meta.url));
const folder = mkdtempSync(join(tmpdir(), "ebbmark-cli-"));
const engines = join(folder, "engines");
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const good = {
  format: "ebbmark-case/1",
  kind: "nozzle",
  fluid: { components: [{ id: "nitrogen", moleFraction: 1 }], equation: "peng-robinson-1976" },
  stagnation: { pressurePa: 1e6, temperatureK: 300 },
  backPressurePa: 101325,
  flowModel: "frozen",
};
const invalid = { ...good, backPressurePa: -1 };
const impossible = {
  ...good,
  fluid: { components: [{ id: "propane", moleFraction: 1 }], equation: "peng-robinson-1976" },
  stagnation: { pressurePa: 1e6, vapourMoleFraction: 0.5 },
};

const file = (name: string, content: unknown): string => {
  const path = join(folder, name);
  writeFileSync(path, typeof content === "string" ? content : JSON.stringify(content));
  return path;
};

function ebbmark(args: string[], input = "") {
  const { status, stdout, stderr } = spawnSync(process.execPath, [join(root, "src/cli/ebbmark.mjs"), ...args], {
    input,
    encoding: "utf8",
    env: { ...process.env, EBBMARK_ENGINE_DIR: engines },
  });
  return { status, stdout, stderr, documents: stdout.split("\n").filter(Boolean) };
}

type Printed = {
  format: string;
  code?: string;
  kind?: string;
  massFluxKgPerM2S?: number;
  problems?: { path: string; message: string }[];
};
const read = (text: string) => JSON.parse(text) as Printed;

describe("ebbmark run", () => {
  beforeAll(() => {
    expect(ebbmark(["run", file("first.json", good)]).status).toBe(0); // builds the engine, silently
  }, 60_000);

  it("prints one result and nothing else, and exits 0", () => {
    const { status, stdout, stderr } = ebbmark(["run", file("good.json", good)]);
    expect({ status, stderr }).toEqual({ status: 0, stderr: "" });
    expect(read(stdout)).toMatchObject({ format: "ebbmark-result/1", kind: "nozzle" });
    // Check M3-03 of tests/fixtures/checks/methods.json (reference equation in CoolProp): 2302.6 kg/(m² s); Peng-Robinson within 1 %.
    expect(Math.abs((read(stdout).massFluxKgPerM2S ?? 0) / 2302.6 - 1)).toBeLessThan(0.01);
  });

  it("reads standard input", () => {
    expect(ebbmark(["run", "-"], JSON.stringify(good)).status).toBe(0);
  });

  it("exits 2 with the path of what is wrong", () => {
    const { status, stdout } = ebbmark(["run", file("invalid.json", invalid)]);
    expect(status).toBe(2);
    expect(read(stdout)).toMatchObject({
      format: "ebbmark-error/1",
      code: "invalid-case",
      problems: [{ path: "backPressurePa" }],
    });
  });

  it("exits 3 with a code where a valid case cannot be computed", () => {
    const { status, stdout } = ebbmark(["run", file("impossible.json", impossible)]);
    expect(status).toBe(3);
    expect(read(stdout)).toMatchObject({ format: "ebbmark-error/1", code: "two-phase-start", problems: [{ path: "flowModel" }] });
  });

  it.each([
    ["no such file", () => join(folder, "absent.json"), /cannot be read/],
    ["a folder", () => folder, /cannot be read/],
    ["text that is not JSON", () => file("text.json", "{ not json"), /not valid JSON/],
    ["a key that stands twice", () => file("twice.json", '{"kind":"path","kind":"flash"}'), /twice/],
    ["an empty file", () => file("empty.json", ""), /not valid JSON/],
  ])("exits 2 for %s", (_what, path, words) => {
    const { status, stdout } = ebbmark(["run", path()]);
    expect(status).toBe(2);
    expect(read(stdout).problems?.[0]?.message).toMatch(words);
  });

  it("prints one document a line for several files, in order, and exits with the highest status", () => {
    const files = [file("a.json", good), file("b.json", invalid), file("c.json", good), file("d.json", impossible)];
    const { status, documents } = ebbmark(["run", ...files]);
    expect(status).toBe(3);
    expect(documents.map((line) => read(line).code ?? "ok")).toEqual(["ok", "invalid-case", "ok", "two-phase-start"]);
    expect(ebbmark(["run", files[0] ?? "", files[1] ?? ""]).status).toBe(2);
  });

  it("gives the same bytes twice, wall-clock time aside", () => {
    const path = file("again.json", good);
    expect(ebbmark(["run", path]).stdout).toBe(ebbmark(["run", path]).stdout);
  });

  it.each([[[]], [["run"]], [["walk", "x"]], [["run", "--fast", "x"]]])("explains itself on standard error for %j", (args) => {
    const { status, stdout, stderr } = ebbmark(args);
    expect({ status, stdout }).toEqual({ status: 1, stdout: "" });
    expect(stderr).toMatch(/Usage/);
  });

  it("explains itself and exits 0 when asked to", () => {
    expect(ebbmark(["--help"])).toMatchObject({ status: 0, stdout: "", stderr: expect.stringMatching(/Usage/) as string });
  });
});

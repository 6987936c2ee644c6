// Every example of docs/case-format.md is computed, and the page names what the code knows.
import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { equationIds } from "@/engine/cases/fluid-spec";
import { steelIds } from "@/engine/steels/steel";
import { inputIds } from "@/engine/studies/inputs";
import { headShapes } from "@/engine/vessel/head";
import { runText } from "@/workers/engine-entry";

const page = readFileSync(new URL("../../docs/case-format.md", import.meta.url), "utf8");
const examples = [...page.matchAll(/```json\n([\s\S]*?)```/g)].map((match) => match[1] ?? "");

describe("the page of the case format", () => {
  it.each(examples.map((text) => [(JSON.parse(text) as { kind: string }).kind, text] as const))(
    "has an example of kind %s that is computed",
    (kind, text) => {
      const outcome = runText(text, { engineVersion: "test" });
      expect(outcome.status === 0 ? outcome.result.kind : outcome.error).toBe(kind);
      if (outcome.status === 0 && outcome.result.kind === "blowdown")
        expect(outcome.result.verdict).toMatch(/within|near|beyond|open/);
    },
  );

  it("covers every kind, steel, head and equation", () => {
    expect(new Set(examples.map((text) => (JSON.parse(text) as { kind: string }).kind))).toEqual(
      new Set(["flash", "path", "nozzle", "relief", "energy", "method", "blowdown", "sizing", "study"]),
    );
    for (const word of [...steelIds, ...headShapes, ...equationIds, ...inputIds]) expect(page).toContain(`\`${word}\``);
  });
});

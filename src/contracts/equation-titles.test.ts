import { expect, it } from "vitest";
import { equations } from "@/engine/eos/registry";
import { equationTitles } from "./equation-titles";

it("names every equation of the registry as the engine does", () => {
  const plain = (text: string | undefined) => text?.replaceAll("–", "-");
  for (const [id, title] of Object.entries(equationTitles)) {
    expect(plain(title)).toBe(plain(equations[id as keyof typeof equations]?.title));
  }
  expect(Object.keys(equationTitles)).toEqual(Object.keys(equations));
});

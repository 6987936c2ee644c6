import { describe, expect, it } from "vitest";
import { libraryRows } from "@/engine/substances/library";
import { componentList, findComponent, searchComponents } from "./component-list";

describe("the list of components for the browser", () => {
  it("says what the library says, row by row", () => {
    expect(componentList).toEqual(libraryRows.map(({ id, name, formula, cas }) => ({ id, name, formula, cas })));
  });

  it.each([
    ["Methane", "methane"],
    ["C1", "methane"],
    ["74-82-8", "methane"],
    ["n-Butane", "n_butane"],
    ["nC4", "n_butane"],
    ["i-C4", "isobutane"],
    ["CO2", "carbon_dioxide"],
    ["hydrogen sulphide", "hydrogen_sulfide"],
  ])("reads “%s” as %s", (written, id) => expect(findComponent(written)?.id).toBe(id));

  it.each(["", "C4H10", "unobtainium", "  "])("takes “%s” for no one component", (written) => {
    expect(findComponent(written)).toBeUndefined();
  });

  it("offers the nearest first", () => {
    expect(searchComponents("prop")[0]?.name).toMatch(/^Prop/i);
    expect(searchComponents("C3")[0]?.id).toBe("propane");
  });
});

/** The parts of a screening's form, in order. Parts 1 to 4 stand once for all cases, 5 to 7 once for each case. */
export const parts = [
  { part: 1, slug: "scope", title: "Scope", perCase: false },
  { part: 2, slug: "inventory", title: "Inventory", perCase: false },
  { part: 3, slug: "fluid", title: "Fluid", perCase: false },
  { part: 4, slug: "steel", title: "Steel", perCase: false },
  { part: 5, slug: "release-path", title: "Release path", perCase: true },
  { part: 6, slug: "heat", title: "Heat", perCase: true },
  { part: 7, slug: "limits", title: "Limits", perCase: true },
] as const;

export type Part = (typeof parts)[number];
export type PartNumber = Part["part"];
export type PartSlug = Part["slug"];

export const partBySlug = (slug: string): Part | undefined => parts.find((part) => part.slug === slug);

export function partByNumber(number: PartNumber): Part {
  const found = parts.find((part) => part.part === number);
  if (!found) throw new RangeError(`there is no part ${number}`);
  return found;
}

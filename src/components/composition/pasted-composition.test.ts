import { expect, it } from "vitest";
import { pastedComposition } from "./pasted-composition";

it("reads a pasted composition by name, formula or CAS number, with what can't be matched kept in sight", () => {
  const rows = pastedComposition("Component\tmol %\nMethane\t91.5\n74-84-0\t4.5\nn-C4;1.25\nMystery gas 0.75\n\n");
  expect(rows.map((row) => [row.component?.id, row.molePercent])).toEqual([
    ["methane", 91.5],
    ["ethane", 4.5],
    ["n_butane", 1.25],
    [undefined, 0.75],
  ]);
  expect(rows[3]?.written).toBe("Mystery gas");
});

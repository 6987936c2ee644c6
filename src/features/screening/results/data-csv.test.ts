import { parse } from "csv-parse/sync";
import { describe, expect, it } from "vitest";
import { madeContent, madeRun } from "../../../../tests/fixtures/screening-view";
import { dataCsv, dataFileName } from "./data-csv";

const written = (system: "SI" | "US") => dataCsv(madeContent(), madeRun(), { system, barometricPressurePa: 101325 });
const read = (text: string) => {
  const [head = [], ...body]: string[][] = parse(text, { comment: "#" });
  return { head, body };
};

describe("the data of a run as CSV", () => {
  it("holds every column in SI and in the unit shown, one row a point", () => {
    const { head, body } = read(written("SI"));
    expect(head.slice(0, 6)).toEqual([
      "time [s]",
      "time [min]",
      "pressure [Pa absolute]",
      "pressure [bar(g)]",
      "fluid temperature [K]",
      "fluid temperature [°C]",
    ]);
    expect(body).toHaveLength(26);
    expect(body.every((row) => row.length === head.length)).toBe(true);
    expect(body[1]?.slice(0, 2)).toEqual(["60", "1"]);
    expect(Number(body[0]?.[3])).toBeCloseTo(84, 6);
  });

  it("follows the other system and leaves columns out that the run has not", () => {
    const { head } = read(written("US"));
    expect(head).toContain("pressure [psig]");
    expect(head.join()).not.toContain("liquid level");
  });

  it("carries the record and its cautions", () => {
    const text = written("SI");
    expect(text).toContain("# SC-0041 rev 2, case A");
    expect(text).toContain("# C1 This is a screening.");
    expect(text).toContain("demo: invented data");
  });

  it("is named after the record", () => expect(dataFileName(madeContent(), "A")).toBe("SC-0041-rev2-A.csv"));
});

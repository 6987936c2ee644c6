import type { DraftDocument } from "@/contracts/draft";
import { demoAssumption, demoSheet, fillDraft } from "./fill-draft";

/** One bottle of the bank on its own small orifice. Every figure is invented. */
export const singleBottle = (): DraftDocument =>
  fillDraft(
    "Single bottle, cold blowdown",
    [
      ["1.03", "bottle valve and XV-5202"],
      ["1.04", "finding"],
      ["1.11", "DS-5201 rev A, action 7 of review HR-52 (demo)"],
      ["2.01-1", "B-5201 A", undefined, demoSheet("DS-5201 rev A")],
      ["2.02-1", "volume", undefined, demoSheet("DS-5201 rev A")],
      ["2.06-1", "50", "L", demoSheet("DS-5201 rev A")],
      ["2.09", "200", "bar(g)", demoSheet("operating manual, filling pressure at 15 °C")],
      ["2.10", "15", "°C", demoSheet("operating manual")],
      ["4.02", "carbon_steel_lt", undefined, demoSheet("DS-5201 rev A")],
      ["4.03", "6.5", "mm", demoSheet("DS-5201 rev A, less corrosion allowance")],
      ["4.04", "1.05", "m²", demoSheet("DS-5201 rev A")],
      ["4.10", "62", "kg", demoSheet("weighed")],
      ["4.05", "-20", "°C", demoSheet("DS-5201 rev A, before the valve was replaced")],
      ["A5.02", "3", "mm", demoSheet("PID 5201 rev C, RO-5207")],
      ["A6.08", "60", "W/(m²·K)", demoAssumption("free convection in a high-pressure gas, order of magnitude")],
    ],
    {
      rows: [{ id: "nitrogen", typed: "100", molePercent: null }],
      normalised: false,
      source: demoSheet("certificate of the filling station"),
    },
  );

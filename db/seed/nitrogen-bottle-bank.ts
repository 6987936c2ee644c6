import type { DraftDocument } from "@/contracts/draft";
import { demoAssumption, demoSheet, fillDraft } from "./fill-draft";

/** Twelve 50-litre bottles of nitrogen on one header, vented through one orifice. Every figure is invented. */
export const nitrogenBottleBank = (): DraftDocument =>
  fillDraft(
    "Nitrogen bottle bank, cold blowdown",
    [
      ["1.03", "XV-5201 and XV-5202"],
      ["1.11", "DS-5201 rev A, PID 5201 rev C (demo)"],
      ["2.01-1", "B-5201 A to L", undefined, demoSheet("DS-5201 rev A")],
      ["2.02-1", "volume", undefined, demoSheet("DS-5201 rev A")],
      ["2.06-1", "0.6", "m³", demoSheet("DS-5201 rev A, 12 bottles of 50 L")],
      ["2.09", "200", "bar(g)", demoSheet("operating manual, filling pressure at 15 °C")],
      ["2.10", "15", "°C", demoSheet("operating manual")],
      ["4.02", "carbon_steel_lt", undefined, demoSheet("DS-5201 rev A")],
      ["4.03", "6.5", "mm", demoSheet("DS-5201 rev A, less corrosion allowance")],
      ["4.04", "12.6", "m²", demoSheet("DS-5201 rev A")],
      ["4.10", "744", "kg", demoSheet("weighed, 12 bottles of 62 kg")],
      ["4.11", "300", "bar(g)", demoSheet("DS-5201 rev A")],
      ["4.05", "-40", "°C", demoSheet("DS-5201 rev A")],
      ["A5.02", "6", "mm", demoSheet("PID 5201 rev C, RO-5203")],
      ["A6.08", "60", "W/(m²·K)", demoAssumption("free convection in a high-pressure gas, order of magnitude")],
    ],
    {
      rows: [{ id: "nitrogen", typed: "100", molePercent: null }],
      normalised: false,
      source: demoSheet("certificate of the filling station"),
    },
  );

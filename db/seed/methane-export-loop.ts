import type { DraftDocument } from "@/contracts/draft";
import { demoAssumption, demoSheet, fillDraft } from "./fill-draft";

/** A loop of lean export gas; the steel keeps the gas warm enough that none of it condenses. Every figure is invented. */
export const methaneExportLoop = (): DraftDocument =>
  fillDraft(
    "Export compressor loop, cold blowdown",
    [
      ["1.03", "ESDV-0801 and ESDV-0804"],
      ["1.11", "DS-0801 rev B, PID 0801 rev F (demo)"],
      ["2.01-1", "D-0801", undefined, demoSheet("DS-0801 rev B")],
      ["2.02-1", "cylinder-horizontal", undefined, demoSheet("DS-0801 rev B")],
      ["2.03-1", "ellipsoidal-2-1", undefined, demoSheet("DS-0801 rev B")],
      ["2.04-1", "1200", "mm", demoSheet("DS-0801 rev B")],
      ["2.05-1", "6", "m", demoSheet("DS-0801 rev B, with the piping between the valves")],
      ["2.09", "70", "bar(g)", demoSheet("settle-out pressure, study PS-0801")],
      ["2.10", "35", "°C", demoSheet("settle-out temperature, study PS-0801")],
      ["4.02", "carbon_steel_lt", undefined, demoSheet("DS-0801 rev B")],
      ["4.03", "45", "mm", demoSheet("DS-0801 rev B, less corrosion allowance")],
      ["4.11", "92", "bar(g)", demoSheet("DS-0801 rev B")],
      ["4.05", "-29", "°C", demoSheet("DS-0801 rev B")],
      ["A5.02", "11", "mm", demoSheet("PID 0801 rev F, RO-0806")],
      ["A6.08", "120", "W/(m²·K)", demoAssumption("free convection at settle-out pressure, order of magnitude")],
    ],
    {
      rows: [
        { id: "methane", typed: "96.80", molePercent: null },
        { id: "ethane", typed: "1.70", molePercent: null },
        { id: "nitrogen", typed: "1.10", molePercent: null },
        { id: "carbon_dioxide", typed: "0.40", molePercent: null },
      ],
      normalised: false,
      source: demoSheet("laboratory report LR-0801"),
    },
  );

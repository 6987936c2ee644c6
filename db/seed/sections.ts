/** Sections of the demo facility. Invented. */
export const demoSections = [
  {
    tag: "IS-08",
    name: "Export compressor loop",
    description: "Lean gas between suction and export valves; vents to the high-pressure header. Demo.",
  },
  {
    tag: "IS-21",
    name: "Inlet separation",
    description: "Inlet separator and its piping; holds gas, condensate and water. Demo.",
  },
  {
    tag: "IS-31",
    name: "Propane refrigerant drum",
    description: "Refrigerant drum of the chiller loop; holds boiling propane. Demo.",
  },
  { tag: "IS-40", name: "CO2 injection header", description: "Dense carbon dioxide to the injection wells. Demo." },
  { tag: "IS-52", name: "Nitrogen bottle bank", description: "Twelve bottles of 50 L at 200 bar for the snuffing system. Demo." },
] as const;

/** The cases that the speed of the engine is measured on: bottle, lean gas, condensing rich gas, boiling propane, dense carbon dioxide. */
import type { BlowdownCase } from "@/engine/cases/blowdown-case";
import type { FluidSpec } from "@/engine/cases/fluid-spec";

const fluid = (parts: Record<string, number>): FluidSpec => ({
  equation: "peng-robinson-1976",
  components: Object.entries(parts).map(([id, moleFraction]) => ({ id, moleFraction })),
});

const lean = fluid({
  nitrogen: 0.01,
  carbon_dioxide: 0.02,
  methane: 0.85,
  ethane: 0.06,
  propane: 0.03,
  isobutane: 0.007,
  n_butane: 0.009,
  isopentane: 0.005,
  n_pentane: 0.004,
  n_hexane: 0.005,
});
const rich = fluid({
  nitrogen: 0.01,
  carbon_dioxide: 0.02,
  methane: 0.67,
  ethane: 0.11,
  propane: 0.09,
  isobutane: 0.02,
  n_butane: 0.03,
  isopentane: 0.015,
  n_pentane: 0.015,
  n_hexane: 0.02,
});

type Choice = {
  volumeM3: number;
  areaM2: number;
  thicknessM: number;
  boreM: number;
  film: number;
  stopPressurePa: number;
  flowModel?: "frozen" | "equilibrium";
};

function vessel(
  of: FluidSpec,
  start: BlowdownCase["start"],
  { volumeM3, areaM2, thicknessM, boreM, film, stopPressurePa, flowModel = "frozen" }: Choice,
): BlowdownCase {
  return {
    format: "ebbmark-case/1",
    kind: "blowdown",
    fluid: of,
    vessel: { geometry: { shape: "volume", volumeM3, innerAreaM2: areaM2 }, wall: { steel: "carbon_steel", thicknessM } },
    start,
    release: {
      path: "orifice",
      diameterM: boreM,
      dischargeCoefficient: 0.85,
      from: "vapour",
      backPressurePa: 101325,
      openingTimeS: 0,
      flowModel,
    },
    heat: { inside: { model: "constant", coefficientWPerM2K: film }, wall: { model: "lumped" }, outside: { model: "adiabatic" } },
    run: { stopTimeS: 7200, stopPressurePa, relativeTolerance: 1e-5 },
  };
}

export const benchCases: { title: string; targetMs: number; document: BlowdownCase }[] = [
  {
    title: "nitrogen bottle, 150 bar",
    targetMs: 3,
    document: vessel(
      fluid({ nitrogen: 1 }),
      { pressurePa: 1.5e7, temperatureK: 290 },
      { volumeM3: 0.1, areaM2: 1.4, thicknessM: 0.025, boreM: 0.006, film: 150, stopPressurePa: 1.1e5 },
    ),
  },
  {
    title: "lean gas, ten components, 70 bar, 30 m³",
    targetMs: 20,
    document: vessel(
      lean,
      { pressurePa: 7e6, temperatureK: 300 },
      { volumeM3: 30, areaM2: 65, thicknessM: 0.03, boreM: 0.03, film: 60, stopPressurePa: 2e5 },
    ),
  },
  {
    title: "rich gas, ten components, condensing",
    targetMs: 15,
    document: vessel(
      rich,
      { pressurePa: 5e6, temperatureK: 320 },
      { volumeM3: 30, areaM2: 65, thicknessM: 0.03, boreM: 0.035, film: 60, stopPressurePa: 2e5 },
    ),
  },
  {
    title: "propane, 60 % liquid, wall",
    targetMs: 8,
    document: vessel(
      fluid({ propane: 1 }),
      { temperatureK: 293, liquidVolumeFraction: 0.6 },
      { volumeM3: 5, areaM2: 17, thicknessM: 0.015, boreM: 0.03, film: 200, stopPressurePa: 1.05e5 },
    ),
  },
  {
    title: "dense carbon dioxide to its triple point",
    targetMs: 20,
    document: vessel(
      fluid({ carbon_dioxide: 1 }),
      { pressurePa: 1.2e7, temperatureK: 293 },
      { volumeM3: 2, areaM2: 9, thicknessM: 0.02, boreM: 0.012, film: 80, stopPressurePa: 1.2e5, flowModel: "equilibrium" },
    ),
  },
];

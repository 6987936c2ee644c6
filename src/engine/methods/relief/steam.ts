import { reliefCaution } from "../../cautions";
import { highestSteamPressurePa, napierCorrection, steamAreaM2 } from "../../relief/steam-sizing";
import { gives, number } from "../field";
import { defineMethod } from "../method";
import { sizingFactors } from "./shared-fields";

export const steam = defineMethod({
  id: "relief-steam",
  chapter: "relief",
  title: "Relief area, steam",
  source: "API Std 520-1, sizing for steam (Napier's equation)",
  formula: String.raw`A = \frac{190.5\,W}{p_1\,K_d\,K_b\,K_c\,K_N\,K_{SH}},\qquad K_N = \frac{0.02764\,p_1-1000}{0.03324\,p_1-1061}\ \text{above 10\,339 kPa, else 1}`,
  inputs: {
    massFlowKgPerS: number("W", "Required mass flow", "kg/s", { above: 0, max: 1e5 }),
    relievingPressurePa: number("p_1", "Relieving pressure, absolute", "Pa", { above: 0, max: highestSteamPressurePa }),
    ...sizingFactors(0.975),
    backPressureFactor: number("K_b", "Back-pressure factor", "", { above: 0, max: 1, default: 1 }),
    superheatFactor: number("K_{SH}", "Superheat factor, from the standard's table; 1 for saturated steam", "", {
      above: 0,
      max: 1,
      default: 1,
    }),
  },
  outputs: {
    requiredAreaM2: gives("A", "Required effective area", "m²"),
    napierCorrection: gives("K_N", "Napier's correction", ""),
  },
  cautions: [reliefCaution],
  evaluate: (given) => ({
    requiredAreaM2: steamAreaM2(given),
    napierCorrection: napierCorrection(given.relievingPressurePa),
  }),
});

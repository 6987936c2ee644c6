/** The stream of each relief scenario. */
import type { ReliefScenario } from "../../cases/relief-case";
import { flashPT } from "../../flash/flash-pt";
import { poolFireHeatW } from "../../heat/pool-fire";
import type { Relieving, ReliefStream } from "../relief-stream";
import { boiling } from "./boiling";
import { gasInFire } from "./gas-in-fire";
import { liquidExpansion } from "./liquid-expansion";
import { brokenTube, flowThrough, passage } from "./passage";

export function streamOf(given: ReliefScenario, relieving: Relieving): ReliefStream {
  switch (given.scenario) {
    case "fire-wetted": {
      const heatW = poolFireHeatW(given.wettedAreaM2, given.drainage, given.environmentFactor);
      return boiling(
        relieving,
        heatW,
        `Pool fire on ${given.wettedAreaM2} m² of wetted surface by API Std 521, ${given.drainage} drainage, F ${given.environmentFactor}; vapour from the latent heat at the relieving pressure.`,
      );
    }
    case "heat-load":
      return boiling(relieving, given.heatW, "A given heat load; vapour from the latent heat at the relieving pressure.");
    case "fire-unwetted":
      return gasInFire(relieving, given);
    case "blocked-outlet":
      return {
        massFlowKgPerS: given.massFlowKgPerS,
        basis: "The whole inlet flow, as given.",
        state: flashPT(relieving.fluid, { temperatureK: given.temperatureK, pressurePa: relieving.relievingPressurePa }),
        composition: relieving.fluid.feed,
        warnings: [],
      };
    case "gas-blow-by":
    case "valve-failure":
      return passage(relieving, given.upstream, flowThrough(relieving, given.through), {
        basis: `Flow of the high-pressure side through the wide-open ${given.through.path === "valve" ? "valve by IEC 60534-2-1" : "opening by isentropic flow"}${given.leavesKgPerS > 0 ? `, less ${given.leavesKgPerS} kg/s that still leave` : ""}.`,
        leavesKgPerS: given.leavesKgPerS,
      });
    case "tube-rupture":
      return passage(relieving, given.upstream, brokenTube(relieving, given.tubeInsideDiameterM, given.dischargeCoefficient), {
        basis: `One tube broken, both ends open, by isentropic flow with a coefficient of ${given.dischargeCoefficient} (API Std 521).`,
        leavesKgPerS: 0,
      });
    case "thermal-expansion":
      return liquidExpansion(
        relieving,
        given.heatW,
        given.temperatureK,
        "Expansion of blocked-in liquid by a given heat (API Std 521).",
      );
    case "ambient-heating":
      return liquidExpansion(
        relieving,
        given.projectedAreaM2 * given.fluxWPerM2 * given.absorptivity,
        given.temperatureK,
        `Expansion of blocked-in liquid by ${given.fluxWPerM2} W/m² on ${given.projectedAreaM2} m², absorptivity ${given.absorptivity}.`,
      );
  }
}

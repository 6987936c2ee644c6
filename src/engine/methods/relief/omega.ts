import { EngineError } from "../../errors";
import { omegaSubcooledFlux, omegaTwoPhaseFlux } from "../../relief/omega";
import { gives, givesWord, number } from "../field";
import { defineMethod } from "../method";
import { reliefCaution } from "../../cautions";

const common = {
  pressurePa: number("p_0", "Stagnation pressure, absolute", "Pa", { above: 0, max: 1e9 }),
  backPressurePa: number("p_2", "Back pressure, absolute", "Pa", { min: 0, max: 1e9, default: 101325 }),
} as const;

function insideInlet({ pressurePa, backPressurePa }: { pressurePa: number; backPressurePa: number }): void {
  if (backPressurePa >= pressurePa) {
    throw new EngineError(
      "invalid-case",
      `The back pressure must be below the inlet, ${pressurePa} Pa.`,
      {},
      "inputs.backPressurePa",
    );
  }
}

/** Not to be read from the inputs, so no bound that could be tested. */
const fluidsItHoldsFor =
  "Holds for a reduced temperature below 0.9, a reduced pressure below 0.5, one component or a boiling range below 80 K, and no supercritical inlet: check these of the fluid.";

export const omegaTwoPhase = defineMethod({
  id: "relief-omega-two-phase",
  chapter: "relief",
  title: "Mass flux, two phases at the inlet, omega method",
  source: "Leung, omega method; API Std 520-1 annex C",
  formula: String.raw`\eta_c^2+(\omega^2-2\omega)(1-\eta_c)^2+2\omega^2\ln\eta_c+2\omega^2(1-\eta_c)=0,\qquad G=\eta_c\sqrt{\frac{p_0}{v_0\,\omega}}`,
  inputs: {
    omega: number("\\omega", "Omega, 9 (v at 0.9 p0 / v0 − 1)", "", { above: 0, max: 1e4 }),
    specificVolumeM3PerKg: number("v_0", "Specific volume at the inlet", "m³/kg", { above: 0, max: 1e4 }),
    ...common,
  },
  outputs: {
    massFluxKgPerM2S: gives("G", "Mass flux of an ideal nozzle", "kg/(m² s)"),
    criticalPressureRatio: gives("\\eta_c", "Critical pressure ratio", ""),
    flow: givesWord("Whether it chokes"),
  },
  cautions: [fluidsItHoldsFor, reliefCaution],
  evaluate: (given) => {
    insideInlet(given);
    const { massFluxKgPerM2S, criticalPressureRatio, choked } = omegaTwoPhaseFlux(given);
    return { massFluxKgPerM2S, criticalPressureRatio, flow: choked ? "choked" : "subcritical" };
  },
});

export const omegaSubcooled = defineMethod({
  id: "relief-omega-subcooled",
  chapter: "relief",
  title: "Mass flux, subcooled or saturated liquid at the inlet, omega method",
  source: "Leung, omega method; API Std 520-1 annex C",
  formula: String.raw`\eta_{st}=\frac{2\omega_s}{1+2\omega_s};\quad \frac{\omega_s+1/\omega_s-2}{2\eta_s}\eta_c^2-2(\omega_s-1)\eta_c+\omega_s\eta_s\ln\frac{\eta_c}{\eta_s}+1.5\,\omega_s\eta_s-1=0`,
  inputs: {
    omega: number("\\omega_s", "Saturated omega, 9 (ρ_l0 / ρ at 0.9 p_sat − 1)", "", { above: 0, max: 1e4 }),
    saturationPressurePa: number("p_s", "Saturation pressure at the inlet temperature", "Pa", { above: 0, max: 1e9 }),
    densityKgPerM3: number("\\rho_{l0}", "Density of the liquid at the inlet", "kg/m³", { above: 0, max: 3e4 }),
    ...common,
  },
  outputs: {
    massFluxKgPerM2S: gives("G", "Mass flux of an ideal nozzle", "kg/(m² s)"),
    criticalPressureRatio: gives("\\eta_c", "Critical pressure ratio", ""),
    subcooling: givesWord("Region: high or low subcooling"),
    flow: givesWord("Whether it chokes"),
  },
  cautions: [fluidsItHoldsFor, reliefCaution],
  evaluate: (given) => {
    insideInlet(given);
    if (given.saturationPressurePa > given.pressurePa) {
      throw new EngineError(
        "invalid-case",
        "The saturation pressure is above the inlet pressure: the inlet holds vapour. Use the method for two phases at the inlet.",
        {},
        "inputs.saturationPressurePa",
      );
    }
    const { massFluxKgPerM2S, criticalPressureRatio, choked, subcooling } = omegaSubcooledFlux(given);
    return { massFluxKgPerM2S, criticalPressureRatio, subcooling, flow: choked ? "choked" : "subcritical" };
  },
});

export const twoPhaseArea = defineMethod({
  id: "relief-two-phase-area",
  chapter: "relief",
  title: "Relief area from a mass flux",
  source: "API Std 520-1 annex C: area from the flux of an ideal nozzle",
  formula: String.raw`A=\frac{W}{K_d\,K_b\,K_c\,K_v\,G}`,
  inputs: {
    massFlowKgPerS: number("W", "Required mass flow", "kg/s", { above: 0, max: 1e5 }),
    massFluxKgPerM2S: number("G", "Mass flux of an ideal nozzle", "kg/(m² s)", { above: 0, max: 1e7 }),
    dischargeCoefficient: number("K_d", "Coefficient of discharge: 0.85 two phases, 0.65 subcooled liquid", "", {
      above: 0,
      max: 1,
      default: 0.85,
    }),
    backPressureFactor: number("K_b", "Back-pressure factor", "", { above: 0, max: 1, default: 1 }),
    combinationFactor: number("K_c", "Combination factor", "", { above: 0, max: 1, default: 1 }),
    viscosityFactor: number("K_v", "Viscosity factor", "", { above: 0, max: 1, default: 1 }),
  },
  outputs: { requiredAreaM2: gives("A", "Required effective area", "m²") },
  cautions: [reliefCaution],
  evaluate: ({
    massFlowKgPerS,
    massFluxKgPerM2S,
    dischargeCoefficient,
    backPressureFactor,
    combinationFactor,
    viscosityFactor,
  }) => ({
    requiredAreaM2:
      massFlowKgPerS / (dischargeCoefficient * backPressureFactor * combinationFactor * viscosityFactor * massFluxKgPerM2S),
  }),
});

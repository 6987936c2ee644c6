/** Required area for liquid through a device with certified liquid capacity (API Std 520-1), evaluated in SI. */

/** Water at 15.6 °C, on which the relative density of the equation stands [kg/m³]. */
const waterDensity = 999.0;
const litresPerMinute = 6e4;

export type LiquidRelief = {
  massFlowKgPerS: number;
  densityKgPerM3: number;
  relievingPressurePa: number;
  backPressurePa: number;
  dischargeCoefficient: number;
  backPressureFactor: number;
  combinationFactor: number;
  viscosityFactor: number;
};

/** A = 11.78 Q/(Kd Kw Kc Kv) √( G/(p1 − p2) ) [mm², L/min, kPa], here in m² from mass flow and density. */
export function liquidAreaM2(given: LiquidRelief): number {
  const { massFlowKgPerS, densityKgPerM3, relievingPressurePa, backPressurePa } = given;
  const flow = (massFlowKgPerS / densityKgPerM3) * litresPerMinute;
  const factors = given.dischargeCoefficient * given.backPressureFactor * given.combinationFactor * given.viscosityFactor;
  const root = Math.sqrt(densityKgPerM3 / waterDensity / ((relievingPressurePa - backPressurePa) / 1e3));
  return ((11.78 * flow) / factors) * root * 1e-6;
}

/** Re = 18 800 Q G/(μ √A) of the standard, for the area of the next larger orifice. */
export function liquidReynolds(massFlowKgPerS: number, densityKgPerM3: number, viscosityPaS: number, areaM2: number): number {
  const flow = (massFlowKgPerS / densityKgPerM3) * litresPerMinute;
  return (18_800 * flow * (densityKgPerM3 / waterDensity)) / (viscosityPaS * 1e3 * Math.sqrt(areaM2 * 1e6));
}

export const viscosityEditions = ["api-520-7th-to-9th", "api-520-10th"] as const;
export type ViscosityEdition = (typeof viscosityEditions)[number];

/** Kv by edition: (0.9935 + 2.878/Re^0.5 + 342.75/Re^1.5)⁻¹, or (1 + 170/Re)^−0.5. */
export const viscosityFactor = (reynolds: number, edition: ViscosityEdition): number =>
  edition === "api-520-10th"
    ? (1 + 170 / reynolds) ** -0.5
    : 1 / (0.9935 + 2.878 / Math.sqrt(reynolds) + 342.75 / reynolds ** 1.5);

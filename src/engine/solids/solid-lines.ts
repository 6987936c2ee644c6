import { EngineError } from "../errors";
import { gasConstant } from "../gas-constant";

/** Triple point of carbon dioxide as Span and Wagner 1996 use it. */
export const carbonDioxideTriple = { temperatureK: 216.592, pressurePa: 517_950 };

/**
 * Sublimation pressure of carbon dioxide.
 *
 *   ln(p/p_t) = (T_t/T) [−14.740846 θ + 2.4327015 θ^1.9 − 5.3061778 θ^2.9],   θ = 1 − T/T_t
 *
 * Source   Span and Wagner, J. Phys. Chem. Ref. Data 25 (1996) 1509, eq. 3.12.
 * Holds    154 to 216.592 K
 * Throws   EngineError "outside-validity"
 * Checks   M5-01 in solids.checks.test.ts
 */
export function carbonDioxideSublimationPressure(temperatureK: number): number {
  requireRange("sublimation of carbon dioxide", temperatureK, 150, carbonDioxideTriple.temperatureK);
  return carbonDioxideSublimationLine(temperatureK);
}

/** The same line without its bounds, for searches along a run: below 154 K it still falls steadily, and only the side of it counts. */
export function carbonDioxideSublimationLine(temperatureK: number): number {
  const { temperatureK: Tt, pressurePa: pt } = carbonDioxideTriple;
  const theta = 1 - temperatureK / Tt;
  const sum = -14.740846 * theta + 2.4327015 * theta ** 1.9 - 5.3061778 * theta ** 2.9;
  return pt * Math.exp((Tt / temperatureK) * sum);
}

/** Molar volume of solid carbon dioxide near its triple point [m³/mol], for the effect of pressure on its fugacity. */
const solidCarbonDioxideVolume = 2.8e-5;

/**
 * Fugacity of solid carbon dioxide at (T, p): where that of carbon dioxide in a fluid is above it, the solid can form.
 *
 *   f_s = p_sub(T) φ_sub exp[v_s (p − p_sub)/(R T)]
 *
 * Source   Poynting correction on the sublimation pressure; v_s about 2.8e-5 m³/mol (a rounded textbook value, from memory).
 * Holds    as the sublimation pressure; further down it is the unbounded line
 * saturatedVapour   φ_sub [-] of the pure vapour at (T, p_sub), by the equation of the fluid
 */
export function solidCarbonDioxideFugacity(
  temperatureK: number,
  pressurePa: number,
  saturatedVapour: (pressurePa: number) => number,
): number {
  const sublimation = carbonDioxideSublimationLine(temperatureK);
  const poynting = (solidCarbonDioxideVolume * (pressurePa - sublimation)) / (gasConstant * temperatureK);
  return sublimation * saturatedVapour(sublimation) * Math.exp(poynting);
}

/**
 * Vapour pressure of liquid water.
 *
 *   ln(p/p_c) = (T_c/T)(−7.85951783 q + 1.84408259 q^1.5 − 11.7866497 q³ + 22.6807411 q^3.5 − 15.9618719 q⁴ + 1.80122502 q^7.5)
 *
 * Source   Wagner and Pruss, J. Phys. Chem. Ref. Data 22 (1993) 783; IAPWS SR1-86(1992).
 * Holds    273.16 to 647.096 K
 * Checks   M5-02
 */
export function waterSaturationPressure(temperatureK: number): number {
  const [Tc, pc] = [647.096, 22.064e6];
  requireRange("vapour pressure of water", temperatureK, 273.15, Tc);
  const q = 1 - temperatureK / Tc;
  const sum =
    -7.85951783 * q +
    1.84408259 * q ** 1.5 -
    11.7866497 * q ** 3 +
    22.6807411 * q ** 3.5 -
    15.9618719 * q ** 4 +
    1.80122502 * q ** 7.5;
  return pc * Math.exp((Tc / temperatureK) * sum);
}

/**
 * Sublimation pressure of ice.
 *
 *   ln(p/611.657 Pa) = (1/θ)(−21.2144006 θ^0.00333333333 + 27.3203819 θ^1.20666667 − 6.10598130 θ^1.70333333),  θ = T/273.16
 *
 * Source   IAPWS R14-08(2011), eq. 6.
 * Holds    50 to 273.16 K
 * Checks   M5-02
 */
export function iceSublimationPressure(temperatureK: number): number {
  requireRange("sublimation of ice", temperatureK, 50, 273.16);
  const theta = temperatureK / 273.16;
  const sum = -21.2144006 * theta ** 0.00333333333 + 27.3203819 * theta ** 1.20666667 - 6.1059813 * theta ** 1.70333333;
  return 611.657 * Math.exp(sum / theta);
}

function requireRange(what: string, T: number, low: number, high: number): void {
  if (!(T >= low && T <= high)) {
    throw new EngineError("outside-validity", `${what} holds from ${low} to ${high} K`, {
      temperatureK: T,
      minimumK: low,
      maximumK: high,
    });
  }
}

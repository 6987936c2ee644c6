import { EngineError } from "../errors";
import { pascalPerPsi } from "../substances/pseudo-component";

const fahrenheitToK = (F: number) => (F + 459.67) / 1.8;
/** Molar mass of dry air [kg/mol], to which gas gravity is referred. */
export const airMolarMass = 0.0289647;

/**
 * Temperature below which a sweet natural gas with free water may form hydrate.
 *
 *   T[°F] = −238.24469 + 78.99667 L − 5.352544 L² + 349.473877 γ − 150.854675 γ² − 27.604065 L γ,   L = log10 p[psia]
 *
 * Source   Motiee, Hydrocarbon Processing 70 (1991) no. 7, 98. Several books misprint the constant as −283.24469.
 * Holds    gravity 0.55 to 1.0, about 34 to 60 °F (from memory); sweet gas
 * Checks   M5-03
 */
export function motieeHydrateTemperature(pressurePa: number, gasGravity: number): number {
  requireGas(pressurePa, gasGravity);
  const L = Math.log10(pressurePa / pascalPerPsi);
  const g = gasGravity;
  return fahrenheitToK(-238.24469 + 78.99667 * L - 5.352544 * L * L + 349.473877 * g - 150.854675 * g * g - 27.604065 * L * g);
}

/**
 * As above: T[°F] = 13.47 ln p + 34.27 ln γ − 1.675 ln p ln γ − 20.35, p in psia.
 *
 * Source   Towler and Mokhatab, Hydrocarbon Processing 84 (2005) no. 4, 61.
 * Holds    gravity 0.55 to 1.0, 260 to 298 K; sweet gas
 * Checks   M5-03
 */
export function towlerMokhatabHydrateTemperature(pressurePa: number, gasGravity: number): number {
  requireGas(pressurePa, gasGravity);
  const lnP = Math.log(pressurePa / pascalPerPsi);
  const lnG = Math.log(gasGravity);
  return fahrenheitToK(13.47 * lnP + 34.27 * lnG - 1.675 * lnP * lnG - 20.35);
}

/** Margin added to the higher of the two correlations [K] (policy, ours). */
export const hydrateMarginK = 3;

/** The temperature below which hydrate is to be flagged: the higher of the two correlations and a margin. */
export function hydrateFlagTemperature(pressurePa: number, gasGravity: number): number {
  return (
    Math.max(motieeHydrateTemperature(pressurePa, gasGravity), towlerMokhatabHydrateTemperature(pressurePa, gasGravity)) +
    hydrateMarginK
  );
}

/**
 * Depression of the hydrate temperature by an inhibitor: ΔT = K_H w/[M (100 − w)], w mass-% of the inhibitor in the water.
 *
 * Source   Hammerschmidt, Gas 15 (1939) no. 5, 30; K_H = 1297 K for methanol (2335 °F).
 * Holds    methanol up to 25 mass-%
 * Checks   M5-04
 */
export function hammerschmidtDepression(massPercent: number, molarMassGPerMol: number, constant = 1297): number {
  if (!(massPercent >= 0 && massPercent <= 40)) {
    throw new EngineError("outside-validity", "the depression holds up to 25 % methanol or 40 % glycol by mass", { massPercent });
  }
  return (constant * massPercent) / (molarMassGPerMol * (100 - massPercent));
}

function requireGas(pressurePa: number, gasGravity: number): void {
  if (!(pressurePa > 0)) throw new EngineError("outside-validity", "pressure must be above 0 Pa", { pressurePa });
  if (!(gasGravity >= 0.55 && gasGravity <= 1)) {
    throw new EngineError("outside-validity", "hydrate correlations hold for gas gravities of 0.55 to 1.0", { gasGravity });
  }
}

/**
 * Energy that the gas in a vessel can release as it expands to its surroundings, by the published ideal-gas definitions.
 * p1, p0 absolute [Pa], V [m³] → J.
 */
export type GasVessel = { pressurePa: number; surroundingsPa: number; volumeM3: number };

/** Brode 1959: heat added at constant volume, (p1 − p0) V/(k − 1). An upper value, used for the near field. */
export const brodeEnergyJ = ({ pressurePa, surroundingsPa, volumeM3 }: GasVessel, k: number): number =>
  ((pressurePa - surroundingsPa) * volumeM3) / (k - 1);

/** Baker et al.: isentropic expansion, p1 V/(k − 1) (1 − (p0/p1)^((k−1)/k)). */
export const isentropicEnergyJ = ({ pressurePa, surroundingsPa, volumeM3 }: GasVessel, k: number): number =>
  ((pressurePa * volumeM3) / (k - 1)) * (1 - (surroundingsPa / pressurePa) ** ((k - 1) / k));

/** Smith and Van Ness: isothermal expansion, p1 V ln(p1/p0). Overstates a sudden burst. */
export const isothermalEnergyJ = ({ pressurePa, surroundingsPa, volumeM3 }: GasVessel): number =>
  pressurePa * volumeM3 * Math.log(pressurePa / surroundingsPa);

/** Crowl 1992: thermodynamic availability, p1 V (ln(p1/p0) − (1 − p0/p1)). */
export const availabilityEnergyJ = ({ pressurePa, surroundingsPa, volumeM3 }: GasVessel): number =>
  pressurePa * volumeM3 * (Math.log(pressurePa / surroundingsPa) - (1 - surroundingsPa / pressurePa));

/** Accumulated and set pressures that the pressure-vessel code allows (ASME VIII-1 UG-125, API Std 520-1). All gauge [Pa]. */
const psi = 6894.757;

export const reliefOccasions = ["one-device", "several-devices", "fire"] as const;
export type ReliefOccasion = (typeof reliefOccasions)[number];

const rules: Record<ReliefOccasion, { share: number; leastPa: number; additionalSet: number }> = {
  "one-device": { share: 1.1, leastPa: 3 * psi, additionalSet: 1 },
  "several-devices": { share: 1.16, leastPa: 4 * psi, additionalSet: 1.05 },
  fire: { share: 1.21, leastPa: 0, additionalSet: 1.1 },
};

/** Highest pressure allowed during relief [Pa gauge] for a maximum allowable working pressure [Pa gauge]. */
export function accumulatedPressureGaugePa(workingPressureGaugePa: number, occasion: ReliefOccasion): number {
  const { share, leastPa } = rules[occasion];
  return Math.max(share * workingPressureGaugePa, workingPressureGaugePa + leastPa);
}

/** Highest set pressure of an additional device [Pa gauge]; the first device is set at or below the working pressure. */
export const additionalSetGaugePa = (workingPressureGaugePa: number, occasion: ReliefOccasion): number =>
  rules[occasion].additionalSet * workingPressureGaugePa;

/**
 * Impact-test exemption curves A to D: lowest metal temperature against governing thickness.
 *
 * Source   ASME VIII-1 figure UCS-66 in the polynomial form printed in ASME VIII-2 and API 579-1 (thickness in inches, °F)
 * Holds    thickness up to 6 in (152 mm); no reduction for a low coincident stress
 */
export const exemptionCurves = ["A", "B", "C", "D"] as const;
export type ExemptionCurve = (typeof exemptionCurves)[number];

const inch = 0.0254;
export const thickestM = 6 * inch;

const fahrenheit: Record<ExemptionCurve, (t: number) => number> = {
  A: (t) => (t <= 0.394 ? 18 : (-76.911 + 284.85 * t - 27.56 * t ** 2) / (1 + 1.7971 * t - 0.17887 * t ** 2)),
  B: (t) =>
    t <= 0.394 ? -20 : -135.79 + 171.56 * Math.sqrt(t) + 103.63 * t - 172 * t ** 1.5 + 73.737 * t ** 2 - 10.535 * t ** 2.5,
  C: (t) => (t <= 0.394 ? -55 : 101.29 - 255.5 / t + 287.86 / t ** 2 - 196.42 / t ** 3 + 69.457 / t ** 4 - 9.8082 / t ** 5),
  D: (t) => (t <= 0.5 ? -55 : -92.965 + 94.065 * t - 39.812 * t ** 2 + 9.6838 * t ** 3 - 1.1698 * t ** 4 + 0.054687 * t ** 5),
};

/** Lowest exempt metal temperature [K] for a governing thickness [m]. */
export const exemptTemperatureK = (curve: ExemptionCurve, thicknessM: number): number =>
  (fahrenheit[curve](thicknessM / inch) + 459.67) / 1.8;

/**
 * Surface tension of a pure non-polar liquid.
 *
 *   σ = pc^⅔ Tc^⅓ (0.132 α_c − 0.279)(1 − Tr)^(11/9)   [mN/m; bar, K],   α_c = 0.9076 [1 + Tbr ln(pc/1.01325)/(1 − Tbr)]
 *
 * Source   Brock and Bird, AIChE J. 1 (1955) 174, with Miller's α_c (1963), as in Poling et al., 5th ed., eq. 12-3.5.
 * Holds    Tr < 1; about 5 % for hydrocarbons
 * Returns  σ [N/m]; 0 at and above the critical temperature
 */
export function brockBirdSurfaceTension(
  fluid: { criticalTemperatureK: number; criticalPressurePa: number; normalBoilingPointK: number },
  temperatureK: number,
): number {
  const { criticalTemperatureK: Tc, normalBoilingPointK: Tb } = fluid;
  const pc = fluid.criticalPressurePa / 1e5;
  const Tr = temperatureK / Tc;
  if (Tr >= 1) return 0;
  const Tbr = Tb / Tc;
  const alpha = 0.9076 * (1 + (Tbr * Math.log(pc / 1.01325)) / (1 - Tbr));
  return pc ** (2 / 3) * Math.cbrt(Tc) * (0.132 * alpha - 0.279) * (1 - Tr) ** (11 / 9) * 1e-3;
}

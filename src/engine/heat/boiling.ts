/**
 * Nucleate boiling on a wetted wall, up to the heat flux at which it fails.
 *
 *   h = 55 p_r^0.12 (−log10 p_r)^−0.55 M^−0.5 q^0.67   (M in g/mol, q in W/m², roughness 1 µm);  with h = q/ΔT: q = (c ΔT)^(1/0.33)
 *   q_max = 0.131 h_fg ρ_v [σ g (ρ_l − ρ_v)/ρ_v²]^(1/4)
 *
 * Source   Cooper, Adv. Heat Transfer 16 (1984) 157; Zuber, AECU-4439 (1959)
 * Holds    p_r from 0.001 to 0.9, M from 2 to 200. ±30 % and worse; a wall past q_max boils as a film and heats up like a dry one, which is not followed.
 * Checks   inside-film.test.ts
 */
export function cooperFlux(reducedPressure: number, molarMassGPerMol: number): (superheatK: number) => number {
  const pr = Math.min(Math.max(reducedPressure, 0.001), 0.9);
  const c = 55 * pr ** 0.12 * (-Math.log10(pr)) ** -0.55 * molarMassGPerMol ** -0.5;
  return (superheatK) => (superheatK <= 0 ? 0 : (c * superheatK) ** (1 / 0.33));
}

export type BoilingPair = {
  latentHeatJPerKg: number;
  vapourDensityKgPerM3: number;
  liquidDensityKgPerM3: number;
  surfaceTensionNPerM: number;
};

export function zuberLimitWPerM2({
  latentHeatJPerKg,
  vapourDensityKgPerM3: v,
  liquidDensityKgPerM3: l,
  surfaceTensionNPerM,
}: BoilingPair): number {
  return 0.131 * latentHeatJPerKg * v * ((surfaceTensionNPerM * 9.80665 * Math.max(l - v, 0)) / (v * v)) ** 0.25;
}

/**
 * Mass flux of a flashing mixture through a nozzle by the omega method (Leung; API Std 520-1 annex C).
 *
 * The mixture's specific volume is taken as v/v0 = ω (p0/p − 1) + 1 along the expansion.
 */
import { bracketedRoot } from "../flash/bracketed-root";

export type OmegaFlow = { massFluxKgPerM2S: number; criticalPressureRatio: number; choked: boolean };

/** ω from the specific volume at 0.9 p0 after an isentropic or isenthalpic flash: 9 (v9/v0 − 1). */
export const omegaOfMixture = (volumeAtNineTenths: number, volume: number): number => 9 * (volumeAtNineTenths / volume - 1);

/** η of choked flow: η² + (ω² − 2ω)(1 − η)² + 2ω² ln η + 2ω² (1 − η) = 0. */
export function omegaCriticalRatio(omega: number): number {
  const f = (eta: number): number =>
    eta ** 2 + (omega ** 2 - 2 * omega) * (1 - eta) ** 2 + 2 * omega ** 2 * Math.log(eta) + 2 * omega ** 2 * (1 - eta);
  return rootOf(f, "critical pressure ratio of the omega method");
}

/** Two phases at the inlet. p0, pb absolute [Pa], v0 [m³/kg] → G [kg/(m² s)]. */
export function omegaTwoPhaseFlux(given: {
  omega: number;
  pressurePa: number;
  specificVolumeM3PerKg: number;
  backPressurePa: number;
}): OmegaFlow {
  const { omega, pressurePa, specificVolumeM3PerKg, backPressurePa } = given;
  const criticalPressureRatio = omegaCriticalRatio(omega);
  const scale = Math.sqrt(pressurePa / specificVolumeM3PerKg);
  const eta2 = backPressurePa / pressurePa;
  if (criticalPressureRatio >= eta2)
    return { massFluxKgPerM2S: (criticalPressureRatio * scale) / Math.sqrt(omega), criticalPressureRatio, choked: true };
  const work = Math.sqrt(-2 * (omega * Math.log(eta2) + (omega - 1) * (1 - eta2)));
  return { massFluxKgPerM2S: (work / (omega * (1 / eta2 - 1) + 1)) * scale, criticalPressureRatio, choked: false };
}

/** Liquid at the inlet, subcooled or saturated; ω_s from the density at 0.9 p_sat: 9 (ρ_l0/ρ_9 − 1). */
export function omegaSubcooledFlux(given: {
  omega: number;
  pressurePa: number;
  saturationPressurePa: number;
  densityKgPerM3: number;
  backPressurePa: number;
}): OmegaFlow & { subcooling: "high" | "low" } {
  const { omega, pressurePa, saturationPressurePa, densityKgPerM3, backPressurePa } = given;
  const etaS = saturationPressurePa / pressurePa;
  const transition = (2 * omega) / (1 + 2 * omega);
  if (etaS < transition) {
    const throat = Math.max(saturationPressurePa, backPressurePa);
    return {
      massFluxKgPerM2S: Math.sqrt(2 * densityKgPerM3 * (pressurePa - throat)),
      criticalPressureRatio: etaS,
      choked: saturationPressurePa >= backPressurePa,
      subcooling: "high",
    };
  }
  const f = (e: number): number =>
    ((omega + 1 / omega - 2) / (2 * etaS)) * e ** 2 -
    2 * (omega - 1) * e +
    omega * etaS * Math.log(e / etaS) +
    1.5 * omega * etaS -
    1;
  const critical = rootOf(f, "critical pressure ratio of subcooled liquid", etaS);
  const e = Math.max(critical, backPressurePa / pressurePa);
  // Above its saturation pressure the liquid does not flash at all.
  const flashes = e < etaS;
  const flux = flashes
    ? Math.sqrt(2 * (1 - etaS) + 2 * (omega * etaS * Math.log(etaS / e) - (omega - 1) * (etaS - e))) /
      (omega * (etaS / e - 1) + 1)
    : Math.sqrt(2 * (1 - e));
  return {
    massFluxKgPerM2S: flux * Math.sqrt(pressurePa * densityKgPerM3),
    criticalPressureRatio: critical,
    choked: critical >= backPressurePa / pressurePa,
    subcooling: "low",
  };
}

function rootOf(f: (x: number) => number, what: string, highest = 1): number {
  const lowest = 1e-6;
  return bracketedRoot(f, { a: lowest, fa: f(lowest), b: highest, fb: f(highest) }, { within: 1e-14, what });
}

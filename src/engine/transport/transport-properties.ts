import type { FluidModel, PhaseState } from "../eos/fluid-model";
import { gasConstant } from "../gas-constant";
import { chungTransport } from "./chung";

export interface TransportProperties {
  viscosityPaS: number;
  conductivityWPerMK: number;
  prandtl: number;
}

/**
 * Viscosity, conductivity and Prandtl number of a phase at the density of its equation of state, the mixture taken as one fluid
 * with mole-fraction means of Tc, Vc, M and ω. For heat-transfer coefficients, whose own scatter is larger.
 *
 * Source   Chung et al. 1988 (chung.ts); the plain means are a screening choice, ours. Dipoles are left out: water, ammonia and
 *          other polar liquids may be wrong by half.
 */
export function transportProperties(model: FluidModel, phase: PhaseState, z: ArrayLike<number>): TransportProperties {
  const means = { Tc: 0, Vc: 0, M: 0, omega: 0 };
  model.substances.forEach((substance, i) => {
    const x = z[i]!;
    means.Tc += x * substance.criticalTemperatureK;
    means.Vc += x * (substance.criticalVolumeM3PerMol ?? estimatedCriticalVolume(substance));
    means.M += x * substance.molarMassKgPerMol;
    means.omega += x * substance.acentricFactor;
  });
  const idealCp = model.idealGas(phase.temperatureK, 1e5, z).heatCapacityPJPerMolK;
  const { viscosityPaS, conductivityWPerMK } = chungTransport(
    {
      criticalTemperatureK: means.Tc,
      criticalVolumeM3PerMol: means.Vc,
      molarMassKgPerMol: means.M,
      acentricFactor: Math.max(0, means.omega), // the correlation was not fitted to quantum gases
    },
    {
      temperatureK: phase.temperatureK,
      molarVolumeM3PerMol: phase.molarVolumeM3PerMol,
      idealHeatCapacityVJPerMolK: idealCp - gasConstant,
    },
  );
  const specificHeat = phase.heatCapacityPJPerMolK / means.M;
  return { viscosityPaS, conductivityWPerMK, prandtl: (specificHeat * viscosityPaS) / conductivityWPerMK };
}

/** Vc = Zc R Tc/pc with Zc = 0.2905 − 0.085 ω (Lee and Kesler, AIChE J. 21 (1975) 510). */
function estimatedCriticalVolume(substance: {
  criticalTemperatureK: number;
  criticalPressurePa: number;
  acentricFactor: number;
}): number {
  const Zc = 0.2905 - 0.085 * substance.acentricFactor;
  return (Zc * gasConstant * substance.criticalTemperatureK) / substance.criticalPressurePa;
}

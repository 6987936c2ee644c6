/**
 * The isentrope of a pure fluid inside its dome, by temperature: everything follows from the two saturated phases.
 *
 *   q = (s0 − s_l)/(s_v − s_l),  v = v_l + q (v_v − v_l),  h likewise;  dp/dT = (s_v − s_l)/(v_v − v_l)  (Clapeyron)
 *   along saturation  v' = (p' − p_T)/p_v,  s' = cv/T + p_T v'  for each phase
 *   M c² = −v² (dp/dT)/(dv/dT)_s  for the equilibrium mixture
 *
 * Source   Clapeyron's equation and the lever rule (any text on thermodynamics)
 */
import { createPhaseState, type FluidModel, type PhaseState } from "../eos/fluid-model";
import { saturationAtTemperature } from "../flash/saturation-pure";

export class SaturatedIsentrope {
  temperatureK = 0;
  pressurePa = 0;
  /** dp/dT along saturation [Pa/K]. */
  slopePaPerK = 0;
  quality = 0;
  molarVolumeM3PerMol = 0;
  enthalpyJPerMol = 0;
  /** M c² of the equilibrium mixture [J/mol]. */
  soundTerm = 0;
  readonly vapour = createPhaseState();
  readonly liquid = createPhaseState();
  /** ds/dT of each saturated phase [J/(mol K²)]. */
  vapourEntropySlope = 0;
  liquidEntropySlope = 0;
  private vapourRate = 0;
  private liquidRate = 0;

  constructor(
    private readonly model: FluidModel,
    private readonly z: ArrayLike<number>,
  ) {}

  /** Saturated phases and mixture of entropy s0 at T; throws what the saturation throws. */
  moveTo(T: number, s0: number): void {
    const { model, z, vapour, liquid } = this;
    if (!this.stepTo(T)) {
      const saturation = saturationAtTemperature(model, T, z);
      model.phaseAtVolume(T, saturation.vapourVolume, z, vapour);
      model.phaseAtVolume(T, saturation.liquidVolume, z, liquid);
    }
    const spread = vapour.molarVolumeM3PerMol - liquid.molarVolumeM3PerMol;
    const slope = (vapour.entropyJPerMolK - liquid.entropyJPerMolK) / spread;
    const vapourRate = (slope - vapour.pressureByTemperature) / vapour.pressureByVolume;
    const liquidRate = (slope - liquid.pressureByTemperature) / liquid.pressureByVolume;
    this.vapourEntropySlope = vapour.heatCapacityVJPerMolK / T + vapour.pressureByTemperature * vapourRate;
    this.liquidEntropySlope = liquid.heatCapacityVJPerMolK / T + liquid.pressureByTemperature * liquidRate;
    const latent = vapour.entropyJPerMolK - liquid.entropyJPerMolK;
    const q = (s0 - liquid.entropyJPerMolK) / latent;
    const qRate = -(this.liquidEntropySlope + q * (this.vapourEntropySlope - this.liquidEntropySlope)) / latent;
    const v = liquid.molarVolumeM3PerMol + q * spread;
    const vRate = liquidRate + q * (vapourRate - liquidRate) + qRate * spread;
    this.temperatureK = T;
    this.pressurePa = vapour.pressurePa;
    this.vapourRate = vapourRate;
    this.liquidRate = liquidRate;
    this.slopePaPerK = slope;
    this.quality = q;
    this.molarVolumeM3PerMol = v;
    this.enthalpyJPerMol = liquid.enthalpyJPerMol + q * (vapour.enthalpyJPerMol - liquid.enthalpyJPerMol);
    this.soundTerm = (-v * v * slope) / vRate;
  }

  /**
   * Newton on p_v = p_l, g_v = g_l in the two volumes, from those of the last temperature carried along the saturation line:
   *
   *   dp_v = (v_l Δp − Δg)/(v_v − v_l),  dp_l = dp_v + Δp,  dv = dp/p_v  for each phase
   */
  private stepTo(T: number): boolean {
    const { model, z, vapour, liquid } = this;
    const change = T - this.temperatureK;
    if (!(this.pressurePa > 0 && Math.abs(change) < 0.05 * T)) return false;
    // A vapour's volume goes with 1/p nearly, a liquid's in a straight line.
    let light = vapour.molarVolumeM3PerMol * Math.exp((this.vapourRate * change) / vapour.molarVolumeM3PerMol);
    let dense = liquid.molarVolumeM3PerMol + this.liquidRate * change;
    for (let i = 0; i < 8; i++) {
      if (!(light > 1.02 * dense && dense > 0)) return false;
      model.phaseAtVolume(T, light, z, vapour);
      model.phaseAtVolume(T, dense, z, liquid);
      if (!(vapour.pressureByVolume < 0 && liquid.pressureByVolume < 0)) return false;
      const pressureGap = vapour.pressurePa - liquid.pressurePa;
      const gibbsGap = vapour.enthalpyJPerMol - liquid.enthalpyJPerMol - T * (vapour.entropyJPerMolK - liquid.entropyJPerMolK);
      const rise = (dense * pressureGap - gibbsGap) / (light - dense);
      const lightStep = rise / vapour.pressureByVolume;
      const denseStep = (rise + pressureGap) / liquid.pressureByVolume;
      const largest = Math.max(Math.abs(lightStep / light), Math.abs(denseStep / dense));
      if (!(largest < 0.3)) return false;
      if (largest < 1e-11) return true;
      light += lightStep;
      dense += denseStep;
    }
    return false;
  }

  /** The saturated phase that one phase of the isentrope meets, and how far its entropy is from s0. */
  side(which: "vapour" | "liquid"): { phase: PhaseState; slope: number } {
    return which === "vapour"
      ? { phase: this.vapour, slope: this.vapourEntropySlope }
      : { phase: this.liquid, slope: this.liquidEntropySlope };
  }
}

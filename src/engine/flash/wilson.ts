import type { FluidModel } from "../eos/fluid-model";

/**
 * First guess of ln K_i = ln(pc_i/p) + 5.373 (1 + ω_i)(1 − Tc_i/T).
 *
 * Source   Wilson, A modified Redlich-Kwong equation of state applicable to general physical data calculations, AIChE 65th
 *          national meeting, Cleveland 1968. A starting value only: nothing in a result depends on it.
 */
export function wilsonLnK(model: FluidModel, T: number, p: number, out: Float64Array): void {
  const { criticalTemperaturesK: Tc, criticalPressuresPa: pc, acentricFactors: omega } = model;
  for (let i = 0; i < out.length; i++) {
    const lnK = Math.log(pc[i]! / p) + 5.373 * (1 + omega[i]!) * (1 - Tc[i]! / T);
    out[i] = Math.max(-250, Math.min(250, lnK));
  }
}

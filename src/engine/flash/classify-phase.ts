import type { FluidModel } from "../eos/fluid-model";
import type { PhaseKind } from "./equilibrium";

/**
 * The word for a single phase. It steers labels and the choice of a flow model, never an energy.
 *
 * Critical temperature of the mixture Tc = Σ θ_i Tc_i with θ_i the share of critical volume, critical volumes taken as
 * proportional to Tc_i/pc_i; critical pressure Σ z_i pc_i. Below Tc a phase denser than 0.3 R Tc/pc per mole is a liquid.
 *
 * Source   Li, Can. J. Chem. Eng. 49 (1971) 709-710 (critical temperature of a mixture).
 */
export function classifyPhase(model: FluidModel, T: number, p: number, v: number, z: ArrayLike<number>): PhaseKind {
  const { criticalTemperaturesK: Tc, criticalPressuresPa: pc, gasConstantJPerMolK: R } = model;
  let volume = 0;
  let weighted = 0;
  let criticalPressure = 0;
  for (let i = 0; i < z.length; i++) {
    const own = z[i]! * 0.3 * R * (Tc[i]! / pc[i]!);
    volume += own;
    weighted += own * Tc[i]!;
    criticalPressure += z[i]! * pc[i]!;
  }
  if (T >= weighted / volume) return p >= criticalPressure ? "supercritical" : "vapour";
  return v < volume ? "liquid" : "vapour";
}

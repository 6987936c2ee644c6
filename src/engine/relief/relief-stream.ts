/** What reaches a relief device: the flow that must pass, and the equilibrium at the relieving pressure in which it arrives. */
import type { FluidModel } from "../eos/fluid-model";
import type { Equilibrium } from "../flash/equilibrium";

export type ReliefStream = {
  massFlowKgPerS: number;
  /** One sentence with the source of the flow. */
  basis: string;
  /** At the relieving pressure, of the composition that leaves. */
  state: Equilibrium;
  composition: ArrayLike<number>;
  heatW?: number;
  latentHeatJPerKg?: number;
  warnings: string[];
};

export type Relieving = { fluid: FluidModel; relievingPressurePa: number };

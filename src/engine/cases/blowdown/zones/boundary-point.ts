/**
 * Bubble temperature of a liquid, or dew temperature of a vapour, at a pressure, with the phase that forms there; warm from the last one.
 *
 *   bubble  Σ K_i x_i = 1, y_i = K_i x_i        dew  Σ y_i/K_i = 1, x_i = y_i/K_i        K_i = φ_i^l/φ_i^v
 *
 * Successive substitution in the composition with secant steps in T.
 *
 * Source   any text on phase equilibrium
 * Returns  false where there is no such point near by (above the critical pressure, or the two phases run together)
 */
import { createPhaseState, type FluidModel, type PhaseState } from "../../../eos/fluid-model";
import { EngineError } from "../../../errors";
import { onlyComponent } from "../../../flash/saturation-pure";

const mostSteps = 60;
const settled = 1e-10;

export class BoundaryPoint {
  temperatureK = 0;
  /** Of the phase that forms. */
  readonly composition: Float64Array;
  readonly forming: PhaseState = createPhaseState();
  /** Enthalpy of the forming phase less that of the phase it forms from, per mole [J/mol]. */
  latentJPerMol = 0;
  /** Did the last search find it? */
  isCurrent = false;
  private known = false;
  private pure = false;
  private readonly lnVapour: Float64Array;
  private readonly lnLiquid: Float64Array;
  private readonly parent: PhaseState = createPhaseState();

  constructor(
    private readonly fluid: FluidModel,
    private readonly of: "liquid" | "vapour",
  ) {
    const count = fluid.componentIds.length;
    this.composition = new Float64Array(count);
    this.lnVapour = new Float64Array(count);
    this.lnLiquid = new Float64Array(count);
  }

  /** Starts the next search from a phase that is known to be in equilibrium at T. */
  startFrom(temperatureK: number, composition: ArrayLike<number>): void {
    this.temperatureK = temperatureK;
    this.composition.set(composition);
    this.known = true;
  }

  find(pressurePa: number, z: ArrayLike<number>): boolean {
    this.isCurrent = false;
    if (!this.known) return false;
    const [T, kept] = [this.temperatureK, Float64Array.from(this.composition)];
    try {
      this.isCurrent = this.search(pressurePa, z);
      if (this.isCurrent) return true;
    } catch (error) {
      if (!(error instanceof EngineError) || error.code === "cancelled") throw error;
    }
    this.temperatureK = T;
    this.composition.set(kept);
    return false;
  }

  private search(p: number, z: ArrayLike<number>): boolean {
    const { fluid, of, composition: w, lnVapour, lnLiquid } = this;
    const isBubble = of === "liquid";
    this.pure = onlyComponent(z) >= 0;
    let T = this.temperatureK;
    let before: { T: number; f: number } | undefined;
    for (let i = 0; i < mostSteps; i++) {
      fluid.lnFugacityCoefficients(T, p, z, isBubble ? "liquid" : "vapour", isBubble ? lnLiquid : lnVapour);
      fluid.lnFugacityCoefficients(T, p, w, isBubble ? "vapour" : "liquid", isBubble ? lnVapour : lnLiquid);
      let sum = 0;
      let apart = 0;
      let change = 0;
      for (let k = 0; k < w.length; k++) {
        const lnK = lnLiquid[k]! - lnVapour[k]!;
        if (z[k]! > 0) apart = Math.max(apart, Math.abs(lnK));
        const share = z[k]! * Math.exp(isBubble ? lnK : -lnK);
        change += Math.abs(share - w[k]!);
        w[k] = share;
        sum += share;
      }
      // K = 1 throughout is no second phase but the first again; a pure fluid's is told by its latent heat.
      if ((!this.pure && !(apart > 1e-3)) || !(sum > 0)) return false;
      for (let k = 0; k < w.length; k++) w[k] = w[k]! / sum;
      const f = Math.log(sum);
      if (Math.abs(f) < settled && change < 1e-7) {
        this.temperatureK = T;
        return this.energies(T, p, z, isBubble);
      }
      const sign = isBubble ? 1 : -1;
      const secant = before && Math.abs(T - before.T) > 1e-9 * T ? (f - before.f) / (T - before.T) : Number.NaN;
      const typical = (sign * 10) / T;
      const slope = secant * sign > 0.2 * Math.abs(typical) && secant * sign < 6 * Math.abs(typical) ? secant : typical;
      before = { T, f };
      T -= Math.max(Math.min(f / slope, 0.05 * T), -0.05 * T);
      if (!Number.isFinite(T)) return false;
    }
    return false;
  }

  private energies(T: number, p: number, z: ArrayLike<number>, isBubble: boolean): boolean {
    const { fluid, composition, forming, parent } = this;
    fluid.phaseAtPressure(T, p, composition, isBubble ? "vapour" : "liquid", forming);
    fluid.phaseAtPressure(T, p, z, isBubble ? "liquid" : "vapour", parent);
    this.latentJPerMol = forming.enthalpyJPerMol - parent.enthalpyJPerMol;
    const least = fluid.gasConstantJPerMolK * T * 0.2;
    return isBubble ? this.latentJPerMol > least : -this.latentJPerMol > least;
  }
}

import { EngineError } from "../errors";
import type { FluidModel } from "../eos/fluid-model";
import { createResidualDerivatives } from "../eos/residual-derivatives";

export interface PureSaturation {
  temperatureK: number;
  pressurePa: number;
  vapourVolume: number;
  liquidVolume: number;
}

/** The one component of `z`, or -1 for a mixture. */
export function onlyComponent(z: ArrayLike<number>): number {
  let found = -1;
  for (let i = 0; i < z.length; i++) {
    if (!(z[i]! > 0)) continue;
    if (found >= 0) return -1;
    found = i;
  }
  return found;
}

/**
 * Saturation pressure of a pure fluid by its equation: equal fugacity of the liquid and the vapour root.
 *
 *   Newton on ln φ_L − ln φ_V in ln p, whose slope is Z_L − Z_V, inside a bracket that each single root closes: a dense one
 *   means that p is too high, a thin one that it is too low.
 *
 * z        composition with one component present
 * Throws   "not-applicable" at or above the critical temperature; "no-convergence"
 */
export function saturationAtTemperature(model: FluidModel, T: number, z: ArrayLike<number>, guessPa?: number): PureSaturation {
  const index = onlyComponent(z);
  const Tc = model.criticalTemperaturesK[index]!;
  const pc = model.criticalPressuresPa[index]!;
  const { residual, gasConstantJPerMolK: R } = model;
  if (!(T < Tc)) {
    throw new EngineError("not-applicable", "above its critical temperature a pure fluid has no saturation pressure", {
      temperatureK: T,
      criticalTemperatureK: Tc,
    });
  }
  residual.setComposition(z);
  const direct = residual.saturation?.(T);
  if (direct) return { temperatureK: T, ...direct };
  const criticalVolume = residual.volumeAtPressure(Tc, pc, "stable");
  const F = createResidualDerivatives(z.length);
  const lnPhi = (v: number, p: number) => {
    residual.evaluate(T, v, 0, F);
    const Z = (p * v) / (R * T);
    return F.F + Z - 1 - Math.log(Z); // pure fluid: ln φ = F + Z − 1 − ln Z
  };
  let low = -Infinity;
  let high = Math.log(pc);
  let x = guessPa ? Math.log(guessPa) : Math.log(pc) + 5.373 * (1 + model.acentricFactors[index]!) * (1 - Tc / T);
  if (!(x < high)) x = high - 1e-3;

  let previous = Infinity;
  for (let iteration = 0; iteration < 200; iteration++) {
    const p = Math.exp(x);
    const liquid = residual.volumeAtPressure(T, p, "liquid");
    const vapour = residual.volumeAtPressure(T, p, "vapour");
    let next: number;
    if (vapour - liquid <= 1e-9 * vapour) {
      if (liquid < criticalVolume) high = Math.min(high, x);
      else low = Math.max(low, x);
      next = low === -Infinity ? x - 0.5 : 0.5 * (low + high);
    } else {
      const difference = lnPhi(liquid, p) - lnPhi(vapour, p);
      const slope = (p * (liquid - vapour)) / (R * T);
      const step = difference / slope;
      if (Math.abs(step) <= 4e-15 || (Math.abs(step) < 1e-12 && Math.abs(step) >= 0.5 * previous)) {
        return { temperatureK: T, pressurePa: p, vapourVolume: vapour, liquidVolume: liquid };
      }
      // The liquid has the lower fugacity: the pressure is above saturation.
      if (difference < 0) high = Math.min(high, x);
      else low = Math.max(low, x);
      previous = Math.abs(step);
      next = x - step;
      if (!(next > low && next < high)) next = low === -Infinity ? x - 1 : 0.5 * (low + high);
    }
    if (high - low < 3e-16 * Math.abs(x) && vapour > liquid * (1 + 1e-6)) {
      return { temperatureK: T, pressurePa: p, vapourVolume: vapour, liquidVolume: liquid };
    }
    x = next;
  }
  throw new EngineError("no-convergence", "the saturation pressure did not converge", {
    temperatureK: T,
    pressurePa: Math.exp(x),
  });
}

/** Saturation temperature of a pure fluid at a pressure below its critical one. */
export function saturationAtPressure(model: FluidModel, p: number, z: ArrayLike<number>): PureSaturation {
  const index = onlyComponent(z);
  const Tc = model.criticalTemperaturesK[index]!;
  const pc = model.criticalPressuresPa[index]!;
  if (!(p < pc)) {
    throw new EngineError("not-applicable", "above its critical pressure a pure fluid does not boil", {
      pressurePa: p,
      criticalPressurePa: pc,
    });
  }
  if (!(Tc > model.temperatureRangeK[0])) {
    throw new EngineError("not-applicable", "this fluid boils only below the temperatures at which its equation is evaluated", {
      criticalTemperatureK: Tc,
      minimumK: model.temperatureRangeK[0],
    });
  }
  const { residual, gasConstantJPerMolK: R } = model;
  const F = createResidualDerivatives(z.length);
  const internalEnergy = (T: number, v: number) => {
    residual.setComposition(z);
    residual.evaluate(T, v, 0, F);
    return -R * T * T * F.FT;
  };
  // ln p is nearly straight in 1/T: Newton there with the slope of Clapeyron, bracketed.
  const lnTarget = Math.log(p);
  let low = 1 / Tc;
  let high = 1 / Math.max(model.temperatureRangeK[0], 0.1 * Tc);
  let y = low * (1 - (lnTarget - Math.log(pc)) / (5.373 * (1 + model.acentricFactors[index]!)));
  if (!(y > low && y < high)) y = low * (1 + 1e-6);
  let previous = Infinity;
  for (let iteration = 0; iteration < 100; iteration++) {
    const T = 1 / y;
    const found = saturationIfAny(model, T, z, iteration > 0 ? p : undefined);
    if (!found) {
      // The equation's own critical temperature lies a little below the published one: nothing boils up here.
      low = y;
      if (high - low < 1e-13 * y) break;
      y = Math.min(y * (1 + 1e-5), 0.5 * (low + high));
      continue;
    }
    const difference = Math.log(found.pressurePa) - lnTarget;
    const volume = found.vapourVolume - found.liquidVolume;
    const heat = internalEnergy(T, found.vapourVolume) - internalEnergy(T, found.liquidVolume) + found.pressurePa * volume;
    const slope = (-heat * T) / (found.pressurePa * volume);
    const step = difference / slope;
    const change = Math.abs(step) * T;
    if (change <= 2e-16 || (change < 1e-12 && change >= 0.5 * previous)) return { ...found, pressurePa: p };
    previous = change;
    if (difference > 0) low = y;
    else high = y;
    let next = y - step;
    if (!(next > low && next < high)) next = 0.5 * (low + high);
    if (high - low < 3e-16 * y) return { ...found, pressurePa: p };
    y = next;
  }
  throw new EngineError("no-convergence", "the saturation temperature did not converge", { pressurePa: p });
}

/** Saturation at a temperature, or undefined where the fluid has none there. Throws "no-convergence". */
export function saturationIfAny(
  model: FluidModel,
  T: number,
  z: ArrayLike<number>,
  guessPa?: number,
): PureSaturation | undefined {
  try {
    return saturationAtTemperature(model, T, z, guessPa);
  } catch (error) {
    if (error instanceof EngineError && error.code === "not-applicable") return undefined;
    throw error;
  }
}

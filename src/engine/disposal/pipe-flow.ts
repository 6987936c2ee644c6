/**
 * Isothermal compressible flow of gas in a vent pipe (API Std 521 form).
 *
 * The standard's constant 3.23e-5 is the rounded value of the exact one that follows from the units; the exact one is used.
 */
import { gasConstant } from "../gas-constant";
import { EngineError } from "../errors";
import { bracketedRoot } from "../flash/bracketed-root";

export type PipeGas = {
  massFlowKgPerS: number;
  diameterM: number;
  temperatureK: number;
  molarMassKgPerMol: number;
  compressibility: number;
};

/** Mach number where the pressure is `pressurePa`: W/(p A) √(Z R T/(k M)). With k = 1 it refers to the isothermal limit. */
export function machAt(gas: PipeGas, pressurePa: number, heatCapacityRatio: number): number {
  const { massFlowKgPerS, diameterM, temperatureK, molarMassKgPerMol, compressibility } = gas;
  const area = (Math.PI / 4) * diameterM ** 2;
  const root = Math.sqrt((compressibility * gasConstant * temperatureK) / (heatCapacityRatio * molarMassKgPerMol));
  return (massFlowKgPerS / (pressurePa * area)) * root;
}

/** Pressure at which the flow would be at its isothermal limit, below which it cannot leave the pipe [Pa]. */
export const chokedOutletPressurePa = (gas: PipeGas): number => machAt(gas, 1, 1);

/**
 * Pressure at the inlet for a pressure at the outlet [Pa absolute]:
 * f L/d + K = (1/Ma2²)(p1/p2)² (1 − (p2/p1)²) − 2 ln(p1/p2), f Darcy, Ma2 isothermal at the outlet.
 * Where the outlet would be choked, the outlet pressure is raised to the choked one.
 */
export function inletPressurePa(
  gas: PipeGas,
  outletPressurePa: number,
  resistance: number,
): { inletPa: number; outletPa: number; choked: boolean } {
  const least = chokedOutletPressurePa(gas);
  const choked = outletPressurePa < least;
  const outletPa = choked ? least : outletPressurePa;
  const machSquared = machAt(gas, outletPa, 1) ** 2;
  const f = (ratio: number): number => (ratio ** 2 - 1) / machSquared - 2 * Math.log(ratio) - resistance;
  if (resistance === 0) return { inletPa: outletPa, outletPa, choked };
  let highest = 2;
  while (f(highest) < 0 && highest < 1e6) highest *= 2;
  if (f(highest) < 0)
    throw new EngineError("no-convergence", "No inlet pressure below a million times the outlet's fits this pipe.", {
      resistance,
    });
  const ratio = bracketedRoot(
    f,
    { a: 1, fa: f(1), b: highest, fb: f(highest) },
    { within: 1e-13, what: "inlet pressure of a pipe" },
  );
  return { inletPa: ratio * outletPa, outletPa, choked };
}

/** Darcy friction factor: 64/Re up to 2300, else Colebrook 1939: 1/√f = −2 log10(ε/(3.7 d) + 2.51/(Re √f)). */
export function frictionFactor(reynolds: number, relativeRoughness: number): number {
  if (reynolds <= 2300) return 64 / reynolds;
  let x = -2 * Math.log10(relativeRoughness / 3.7 + 5.74 / reynolds ** 0.9);
  for (let i = 0; i < 50; i++) {
    const next = -2 * Math.log10(relativeRoughness / 3.7 + (2.51 * x) / reynolds);
    const moved = Math.abs(next - x);
    x = next;
    if (moved < 1e-14 * Math.abs(x)) break;
  }
  return x ** -2;
}

export interface LucasFluid {
  criticalTemperatureK: number;
  criticalPressurePa: number;
  molarMassKgPerMol: number;
  /** Dipole moment [D] and critical compressibility; left out for a fluid without a dipole. */
  polar?: { dipoleDebye: number; criticalCompressibility: number };
  /** Q of a quantum gas: hydrogen 0.76, helium 1.38. */
  quantum?: number;
}

/**
 * Viscosity of a gas or dense fluid at low pressure and at pressure.
 *
 *   ξ = 0.176 (Tc/(M³ pc⁴))^(1/6)   [K, g/mol, bar → 1/µP]
 *   Z1 = [0.807 Tr^0.618 − 0.357 e^(−0.449 Tr) + 0.340 e^(−4.058 Tr) + 0.018] FP0 FQ0,   µ0 = Z1/ξ
 *   µ = Z2 FP FQ/ξ with Z2(Tr, pr) as printed below
 *
 * Source   Lucas 1980/84 as in Poling, Prausnitz and O'Connell, 5th ed. (2001), eqs. 9-4.15 and 9-6.8 to 9-6.13.
 * Holds    1 < Tr < 40, 0 < pr < 100; below Tr = 1 up to the saturation pressure. Typical error 5 to 10 %.
 * Returns  viscosities at low pressure and at p [Pa s]
 * Checks   M4-06 in transport.checks.test.ts
 */
export function lucasViscosity(
  fluid: LucasFluid,
  temperatureK: number,
  pressurePa: number,
): { lowPressure: number; atPressure: number } {
  const { criticalTemperatureK: Tc, criticalPressurePa, molarMassKgPerMol, polar, quantum } = fluid;
  const M = molarMassKgPerMol * 1000;
  const pc = criticalPressurePa / 1e5;
  const Tr = temperatureK / Tc;
  const pr = pressurePa / criticalPressurePa;
  const xi = 0.176 * (Tc / (M ** 3 * pc ** 4)) ** (1 / 6);
  const FP0 = polar ? polarFactor(polar, Tr, Tc, pc) : 1;
  const FQ0 = quantum ? 1.22 * quantum ** 0.15 * (1 + 0.00385 * ((Tr - 12) ** 2) ** (1 / M) * Math.sign(Tr - 12)) : 1;
  const Z1 = (0.807 * Tr ** 0.618 - 0.357 * Math.exp(-0.449 * Tr) + 0.34 * Math.exp(-4.058 * Tr) + 0.018) * FP0 * FQ0;
  const Z2 = Tr > 1 ? Z1 * (1 + denseTerm(Tr, pr)) : subcritical(Tr, pr);
  const Y = Z2 / Z1;
  const FP = (1 + (FP0 - 1) * Y ** -3) / FP0;
  const FQ = (1 + (FQ0 - 1) * (1 / Y - 0.007 * Math.log(Y) ** 4)) / FQ0;
  return { lowPressure: (Z1 / xi) * 1e-7, atPressure: ((Z2 * FP * FQ) / xi) * 1e-7 };
}

function polarFactor(
  { dipoleDebye, criticalCompressibility: Zc }: NonNullable<LucasFluid["polar"]>,
  Tr: number,
  Tc: number,
  pc: number,
): number {
  const reduced = (52.46 * dipoleDebye ** 2 * pc) / Tc ** 2;
  if (reduced < 0.022) return 1;
  const rise = 30.55 * Math.max(0, 0.292 - Zc) ** 1.72;
  return reduced < 0.075 ? 1 + rise : 1 + rise * Math.abs(0.96 + 0.1 * (Tr - 0.7));
}

function denseTerm(Tr: number, pr: number): number {
  const a = (1.245e-3 / Tr) * Math.exp(5.1726 * Tr ** -0.3286);
  const b = a * (1.6553 * Tr - 1.2723);
  const c = (0.4489 / Tr) * Math.exp(3.0578 * Tr ** -37.7332);
  const d = (1.7368 / Tr) * Math.exp(2.231 * Tr ** -7.6351);
  const f = 0.9425 * Math.exp(-0.1853 * Tr ** 0.4489);
  return (a * pr ** 1.3088) / (b * pr ** f + 1 / (1 + c * pr ** d));
}

function subcritical(Tr: number, pr: number): number {
  const alpha = 3.262 + 14.98 * pr ** 5.508;
  const beta = 1.39 + 5.746 * pr;
  return 0.6 + 0.76 * pr ** alpha + (6.99 * pr ** beta - 0.6) * (1 - Tr);
}

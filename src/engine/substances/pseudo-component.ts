import { EngineError } from "../errors";
import { keslerLeeHeatCapacity } from "./pseudo-heat-capacity";
import type { Substance } from "./substance";

/** Published correlations work in °R, psia and lb/lbmol; the conversion stays in this folder. */
export const rankinePerKelvin = 1.8;
export const pascalPerPsi = 6894.757293168361;

/**
 * Critical constants and normal boiling point of a petroleum fraction from molar mass and relative density.
 *
 *   θ = a M^b SG^c exp(d M + e SG + f M SG)
 *
 * Source   Riazi and Daubert, Ind. Eng. Chem. Res. 26 (1987) 755-759, (M, SG) form.
 * Holds    M 70 to 300 g/mol, boiling points 300 to 617 K.
 * Returns  Tc, Tb [°R], pc [psia]
 * Checks   pseudo-component.test.ts
 */
export function riaziDaubertFromMolarMass(molarMass: number, relativeDensity: number) {
  const M = molarMass;
  const SG = relativeDensity;
  const theta = (a: number, b: number, c: number, d: number, e: number, f: number) =>
    a * M ** b * SG ** c * Math.exp(d * M + e * SG + f * M * SG);
  return {
    Tc: theta(544.4, 0.2998, 1.0555, -1.3478e-4, -0.61641, 0),
    pc: theta(4.5203e4, -0.8063, 1.6015, -1.8078e-3, -0.3084, 0),
    Tb: theta(6.77857, 0.401673, -1.58262, 3.77409e-3, 2.984036, -4.25288e-3),
  };
}

/**
 * Critical constants and molar mass from boiling point and relative density.
 *
 *   Tc = 24.2787 Tb^0.58848 SG^0.3596, pc = 3.12281e9 Tb^-2.3125 SG^2.3201, M = 4.5673e-5 Tb^2.1962 SG^-1.0164
 *
 * Source   Riazi and Daubert, Hydrocarbon Processing 59 (1980) no. 3, 115-116.
 * Holds    M 70 to 300, Tb 540 to 1110 °R
 */
export function riaziDaubert1980(Tb: number, SG: number) {
  return {
    Tc: 24.2787 * Tb ** 0.58848 * SG ** 0.3596,
    pc: 3.12281e9 * Tb ** -2.3125 * SG ** 2.3201,
    M: 4.5673e-5 * Tb ** 2.1962 * SG ** -1.0164,
  };
}

/**
 * Critical constants, molar mass and acentric factor from boiling point and relative density.
 *
 * Source   Kesler and Lee, Hydrocarbon Processing 55 (1976) no. 3, 153-158; below θ = 0.8 Lee and Kesler, AIChE J. 21 (1975) 510.
 * Holds    Tb to about 1650 °R
 */
export function keslerLee(Tb: number, SG: number) {
  const lnPc =
    8.3634 -
    0.0566 / SG -
    (0.24244 + 2.2898 / SG + 0.11857 / SG ** 2) * 1e-3 * Tb +
    (1.4685 + 3.648 / SG + 0.47227 / SG ** 2) * 1e-7 * Tb ** 2 -
    (0.42019 + 1.6977 / SG ** 2) * 1e-10 * Tb ** 3;
  const pc = Math.exp(lnPc);
  const Tc = 341.7 + 811.1 * SG + (0.4244 + 0.1174 * SG) * Tb + ((0.4669 - 3.26238 * SG) * 1e5) / Tb;
  const M =
    -12272.6 +
    9486.4 * SG +
    (4.6523 - 3.3287 * SG) * Tb +
    ((1 - 0.77084 * SG - 0.02058 * SG ** 2) * (1.3437 - 720.79 / Tb) * 1e7) / Tb +
    ((1 - 0.80882 * SG + 0.02226 * SG ** 2) * (1.8828 - 181.98 / Tb) * 1e12) / Tb ** 3;
  return { Tc, pc, M, omega: leeKeslerAcentricFactor({ Tb, Tc, pc, SG }) };
}

function leeKeslerAcentricFactor({ Tb, Tc, pc, SG }: { Tb: number; Tc: number; pc: number; SG: number }): number {
  const th = Tb / Tc;
  if (th > 0.8) {
    const K = Math.cbrt(Tb) / SG;
    return -7.904 + 0.1352 * K - 0.007465 * K ** 2 + 8.359 * th + (1.408 - 0.01063 * K) / th;
  }
  return (
    (-Math.log(pc / 14.7) - 5.92714 + 6.09648 / th + 1.28862 * Math.log(th) - 0.169347 * th ** 6) /
    (15.2518 - 15.6875 / th - 13.4721 * Math.log(th) + 0.43577 * th ** 6)
  );
}

/**
 * Acentric factor from the boiling point: ω = (3/7) log10(pc/14.7 psia)/(Tc/Tb − 1) − 1.
 *
 * Source   Edmister, Petroleum Refiner 37 (1958) no. 4, 173.
 */
export function edmisterAcentricFactor({ Tb, Tc, pc }: { Tb: number; Tc: number; pc: number }): number {
  return ((3 / 7) * Math.log10(pc / 14.7)) / (Tc / Tb - 1) - 1;
}

/** Above this molar mass [g/mol] the correlation of Riazi and Daubert ends, and that of Kesler and Lee goes on. */
const riaziDaubertLimit = 300;
/** A boiling point of about 900 K, where Kesler and Lee end. */
const keslerLeeLimit = 550;

/**
 * A heavy end from molar mass and relative density: Riazi-Daubert 1987 with Edmister's acentric factor up to 300 g/mol; above, the boiling
 * point at which Kesler and Lee 1976 find that molar mass, and their constants. Heat capacity by Kesler and Lee.
 */
export function pseudoSubstance(id: string, molarMassKgPerMol: number, relativeDensity: number): Substance {
  const M = molarMassKgPerMol * 1000;
  if (!(M >= 70 && M <= keslerLeeLimit)) {
    throw new EngineError("outside-validity", "a pseudo-component needs a molar mass between 0.070 and 0.550 kg/mol", {
      molarMassKgPerMol,
    });
  }
  if (!(relativeDensity >= 0.6 && relativeDensity <= 1)) {
    throw new EngineError("outside-validity", "a pseudo-component needs a relative density between 0.60 and 1.00", {
      relativeDensity,
    });
  }
  const heavy = M > riaziDaubertLimit;
  const { Tc, pc, Tb, omega } = heavy ? byKeslerLee(M, relativeDensity) : byRiaziDaubert(M, relativeDensity);
  if (!(omega > 0 && omega < 2 && Tb < Tc)) {
    throw new EngineError("outside-validity", "molar mass and relative density do not belong to one petroleum fraction", {
      molarMassKgPerMol,
      relativeDensity,
    });
  }
  return {
    id,
    name: id,
    origin: "pseudo",
    molarMassKgPerMol,
    criticalTemperatureK: Tc / rankinePerKelvin,
    criticalPressurePa: pc * pascalPerPsi,
    acentricFactor: omega,
    heatCapacity: keslerLeeHeatCapacity({ M, Tb, SG: relativeDensity, omega }),
    heatCapacityRangeK: [255, 922],
    notes: [
      heavy
        ? `${id}: critical constants, acentric factor and heat capacity by Kesler and Lee 1976, from molar mass and relative density.`
        : `${id}: critical constants by Riazi and Daubert 1987, acentric factor by Edmister 1958, heat capacity by Kesler and Lee 1976, from molar mass and relative density.`,
    ],
  };
}

function byRiaziDaubert(M: number, SG: number) {
  const { Tc, pc, Tb } = riaziDaubertFromMolarMass(M, SG);
  return { Tc, pc, Tb, omega: edmisterAcentricFactor({ Tb, Tc, pc }) };
}

/** The boiling point at which Kesler and Lee's molar mass is M; it rises with boiling point over the range searched. */
function byKeslerLee(M: number, SG: number) {
  let low = 1000;
  let high = 1800;
  for (let k = 0; k < 80; k++) {
    const middle = 0.5 * (low + high);
    if (keslerLee(middle, SG).M < M) low = middle;
    else high = middle;
  }
  const Tb = 0.5 * (low + high);
  const { Tc, pc, omega } = keslerLee(Tb, SG);
  return { Tc, pc, Tb, omega };
}

/** Side-on overpressure of a charge of TNT against scaled distance Z = R/W^(1/3) [m/kg^(1/3)]; overpressure in Pa. */
import { EngineError } from "../errors";
import { bracketedRoot } from "../flash/bracketed-root";

const atmospherePa = 101_325;

/** Kinney and Graham 1985, free air. For a burst on the ground multiply the charge by 1.8. */
export function freeAirOverpressurePa(z: number): number {
  const rise = 808 * (1 + (z / 4.5) ** 2);
  const fall = Math.sqrt(1 + (z / 0.048) ** 2) * Math.sqrt(1 + (z / 0.32) ** 2) * Math.sqrt(1 + (z / 1.35) ** 2);
  return (atmospherePa * rise) / fall;
}

/** Scaled distance at which the free-air curve gives this overpressure [Pa]; it falls all the way. */
export function freeAirScaledDistance(overpressurePa: number): number {
  const f = (lnZ: number): number => Math.log(freeAirOverpressurePa(Math.exp(lnZ)) / overpressurePa);
  const [a, b] = [Math.log(1e-3), Math.log(1e5)];
  return Math.exp(bracketedRoot(f, { a, fa: f(a), b, fb: f(b) }, { within: 1e-12, what: "scaled distance" }));
}

/** Swisdak 1994: the Kingery and Bulmash curves for a hemispherical charge on the ground, simplified; ln p [kPa] in powers of ln Z. */
const surfaceRanges = [
  { upTo: 2.9, c: [7.2106, -2.1069, -0.3229, 0.1117, 0.0685] },
  { upTo: 23.8, c: [7.5938, -3.0523, 0.40977, 0.0261, -0.01267] },
  { upTo: 198.5, c: [6.0536, -1.4066] },
] as const;
export const surfaceScaledDistances = { from: 0.2, to: 198.5 } as const;

export function surfaceOverpressurePa(z: number): number {
  const range = surfaceRanges.find(({ upTo }) => z <= upTo);
  if (!range || z < surfaceScaledDistances.from)
    throw new EngineError("outside-validity", `The curves hold from 0.2 to 198.5 m/kg^(1/3); ${z.toPrecision(4)} is outside.`, {
      z,
    });
  const x = Math.log(z);
  return 1e3 * Math.exp(range.c.reduce<number>((sum, c, power) => sum + c * x ** power, 0));
}

/** Scaled distance at which the surface burst gives this overpressure [Pa]. The curves join within 0.7 %; the larger distance is taken. */
export function surfaceScaledDistance(overpressurePa: number): number {
  const { from, to } = surfaceScaledDistances;
  const [highest, lowest] = [surfaceOverpressurePa(from), surfaceOverpressurePa(to)];
  if (!(overpressurePa >= lowest && overpressurePa <= highest)) {
    throw new EngineError(
      "outside-validity",
      `The curves hold from ${Math.ceil(lowest)} to ${Math.floor(highest)} Pa; ${overpressurePa} Pa is outside.`,
      { overpressurePa },
    );
  }
  const f = (lnZ: number): number => Math.log(surfaceOverpressurePa(Math.min(Math.exp(lnZ), to)) / overpressurePa);
  const [a, b] = [Math.log(from), Math.log(to)];
  return Math.exp(bracketedRoot(f, { a, fa: f(a), b, fb: f(b) }, { within: 1e-12, what: "scaled distance" }));
}

/** Standard effective areas of relief devices by letter (API Std 526). For preliminary sizing with effective coefficients only. */
const squareInch = 645.16e-6;

const areasIn2 = {
  D: 0.11,
  E: 0.196,
  F: 0.307,
  G: 0.503,
  H: 0.785,
  J: 1.287,
  K: 1.838,
  L: 2.853,
  M: 3.6,
  N: 4.34,
  P: 6.38,
  Q: 11.05,
  R: 16,
  T: 26,
} as const;

export type OrificeLetter = keyof typeof areasIn2;
export type StandardOrifice = { letter: OrificeLetter; areaM2: number };

/** Smallest first. */
export const standardOrifices: readonly StandardOrifice[] = (Object.keys(areasIn2) as OrificeLetter[]).map((letter) => ({
  letter,
  areaM2: areasIn2[letter] * squareInch,
}));

export type ChosenOrifices = StandardOrifice & { devices: number };

/** The first standard area that is not smaller; where one device is not enough, the fewest equal ones of the largest needed letter. */
export function chooseOrifices(requiredAreaM2: number): ChosenOrifices {
  const largest = standardOrifices.at(-1)!; // the list above is not empty
  const devices = Math.max(Math.ceil(requiredAreaM2 / largest.areaM2), 1);
  const one = standardOrifices.find(({ areaM2 }) => areaM2 * devices >= requiredAreaM2) ?? largest;
  return { ...one, devices };
}

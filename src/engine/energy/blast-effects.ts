/** Typical effects of a side-on overpressure (Clancey's table as published; the lines on eardrum and lung are from memory). */
const effects: readonly { fromPa: number; words: string }[] = [
  { fromPa: 80e3, words: "threshold of lung damage" },
  { fromPa: 50e3, words: "houses destroyed, loaded rail cars overturned" },
  { fromPa: 35e3, words: "threshold of eardrum rupture" },
  { fromPa: 20e3, words: "steel frames distorted" },
  { fromPa: 14e3, words: "walls collapse in part; lower limit of serious structural damage" },
  { fromPa: 6.9e3, words: "houses partly demolished" },
  { fromPa: 3.5e3, words: "windows shattered, light structural damage" },
  { fromPa: 1e3, words: "windows begin to break" },
  { fromPa: 0, words: "loud noise" },
];

export const effectOf = (overpressurePa: number): string =>
  effects.find(({ fromPa }) => overpressurePa >= fromPa)?.words ?? "loud noise";

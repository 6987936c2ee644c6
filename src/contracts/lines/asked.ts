/** Conditions that several lines share: whether a line is asked for follows from choices made elsewhere. */
import type { LineNo, LineReader } from "./line";

export type Asked = (read: LineReader) => boolean;

export const chosen =
  (no: LineNo, ...words: string[]): Asked =>
  (read) =>
    words.includes(read.choice(no) ?? "");

export const both =
  (...conditions: Asked[]): Asked =>
  (read) =>
    conditions.every((holds) => holds(read));

export const either =
  (...conditions: Asked[]): Asked =>
  (read) =>
    conditions.some((holds) => holds(read));

export const not =
  (condition: Asked): Asked =>
  (read) =>
    !condition(read);

const inAnyCase =
  (no: LineNo, word: string): Asked =>
  (read) =>
    read.inAnyCase(no, word);

/** The steel takes part in the balance. */
export const walled = chosen("4.08", "lumped", "conduction");
export const plainVolume = chosen("2.02", "volume");
/** Ambient air gives or takes heat in some case. */
export const inAir = inAnyCase("6.02", "ambient");
/** Something needs the inside surface: the steel, or a film or fire that acts on the fluid. */
export const needsArea = either(walled, inAir, inAnyCase("6.02", "surface-fire"));
export const startsWithLevel = chosen("2.08", "temperature-level", "pressure-level");
export const inFire = chosen("6.02", "pool-fire", "surface-fire");

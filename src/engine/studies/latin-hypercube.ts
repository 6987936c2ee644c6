/**
 * Latin hypercube: of N samples each variable has exactly one in each of N equal strata of its probability, in an order of its own.
 *
 * Source   McKay, Beckman and Conover, Technometrics 21 (1979) 239
 * Holds    variables independent of each other
 * samples  N; `variables` is the number of columns; the same seed gives the same points on every machine
 * Returns  points[sample][variable], cumulative probabilities in (0, 1)
 * Checks   latin-hypercube.test.ts (M10-02)
 */
export function latinHypercube({ samples, variables, seed }: { samples: number; variables: number; seed: number }): number[][] {
  const random = randomNumbers(seed);
  const columns = Array.from({ length: variables }, () => {
    const column = Array.from({ length: samples }, (_, i) => (i + random()) / samples);
    for (let i = samples - 1; i > 0; i--) {
      const j = Math.floor(random() * (i + 1));
      const kept = column[i] ?? 0;
      column[i] = column[j] ?? 0;
      column[j] = kept;
    }
    return column;
  });
  return Array.from({ length: samples }, (_, i) => columns.map((column) => column[i] ?? 0));
}

/**
 * Numbers in (0, 1) from a 32-bit seed, in whole-number arithmetic, so that every machine has the same.
 *
 * Source   Steele, Lea and Flood, OOPSLA (2014): a counter with a golden step and a mixing function (32-bit form)
 */
export function randomNumbers(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x9e3779b9) >>> 0;
    let mixed = state;
    mixed = Math.imul(mixed ^ (mixed >>> 16), 0x21f0aaad);
    mixed = Math.imul(mixed ^ (mixed >>> 15), 0x735a2d97);
    mixed = (mixed ^ (mixed >>> 15)) >>> 0;
    return (mixed + 0.5) / 4294967296;
  };
}

/**
 * A small generator of pseudo-random numbers in [0, 1) that always gives the same run for a seed
 * (mulberry32, a 32-bit mixing of a counter). For made-up data only.
 */
export function makeRandom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
}

/** One of the choices, drawn with the generator. */
export function pick<T>(random: () => number, choices: readonly T[]): T {
  const chosen = choices[Math.floor(random() * choices.length)];
  if (chosen === undefined) throw new Error('Nothing to pick from.');
  return chosen;
}

/** One clutch that is still to hatch, or has. */
export interface ExpectedClutch {
  /** Fertile eggs: counted once laid, otherwise expected. */
  eggs: number;
  /** Spread of the count while it is not laid: the tenth and ninetieth percentile of the species; null once counted. */
  eggRange: { from: number; to: number } | null;
  /** Share of eggs that hatch, 0–1. */
  hatchRate: number;
  /** Young that were counted, once it has hatched. */
  hatched: number | null;
}

/** The standard normal distribution's ninetieth percentile. */
const Z90 = 1.2815515655446004;

/**
 * Hatchlings of several clutches together: the expectation and the tenth and ninetieth percentile. Each egg hatches or
 * not by itself (binomial), the number of eggs varies as given, clutches are independent; the sum is taken as normal,
 * and the range is cut to what is possible.
 */
export function expectHatchlings(clutches: readonly ExpectedClutch[]): {
  expected: number;
  from: number;
  to: number;
} {
  let expected = 0;
  let variance = 0;
  let least = 0;
  let most = 0;
  for (const { eggs, eggRange, hatchRate, hatched } of clutches) {
    if (hatched !== null) {
      expected += hatched;
      least += hatched;
      most += hatched;
      continue;
    }
    const eggDeviation = eggRange ? (eggRange.to - eggRange.from) / (2 * Z90) : 0;
    expected += eggs * hatchRate;
    variance += eggs * hatchRate * (1 - hatchRate) + (hatchRate * eggDeviation) ** 2;
    most += eggRange ? Math.max(eggRange.to, eggs) : eggs;
  }
  const reach = Z90 * Math.sqrt(variance);
  return {
    expected,
    from: Math.max(least, Math.round(expected - reach)),
    to: Math.min(most, Math.round(expected + reach)),
  };
}

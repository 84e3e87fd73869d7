import Fraction from 'fraction.js';
import { ONE, sum, ZERO } from './fractions';
import { GeneticsError } from './genetics-error';

export interface GoodnessOfFit {
  /** Pearson's statistic; null when a class of expected chance 0 was seen. */
  chiSquared: Fraction | null;
  /** Classes with a chance above 0, less one. */
  degreesOfFreedom: number;
  /** Tail of the χ² distribution; good for expected counts of about 5 or more; 0 when an impossible class was seen. */
  chiSquaredPValue: number;
  /** Exact multinomial test; null when there are more outcomes than the bound. */
  exactPValue: Fraction | null;
  /** Smallest expected count: below 5 the χ² p-value is rough (W. G. Cochran, Biometrics 10, 1954). */
  smallestExpected: number;
}

/** Outcomes that the exact test lists at most. */
const MOST_OUTCOMES = 200_000;

/**
 * Compares counts with expected chances.
 *
 * The exact p-value sums the probability of all outcomes that are no likelier than the observed one, compared exactly
 * as integers. χ² is Pearson's (Philosophical Magazine 50, 1900).
 * @param observed counts by class, whole numbers of 0 or more
 * @param expected chance by class, adding up to 1; classes must be those of `observed` (a missing count is 0)
 * @throws {GeneticsError} 'probability' or 'evidence'
 */
export function testFit(
  observed: Readonly<Record<string, number>>,
  expected: Readonly<Record<string, Fraction>>,
  mostOutcomes = MOST_OUTCOMES,
): GoodnessOfFit {
  for (const [name, count] of Object.entries(observed)) {
    if (!Number.isSafeInteger(count) || count < 0)
      throw new GeneticsError('evidence', name, `"${count}" is no count.`);
    if (!expected[name])
      throw new GeneticsError('evidence', name, `"${name}" was observed but has no expected chance.`);
  }
  const names = Object.keys(expected);
  const chances = Object.values(expected);
  if (chances.some((chance) => chance.lt(0)) || !sum(chances).equals(ONE)) {
    throw new GeneticsError('probability', 'expected', 'The expected chances do not add up to 1.');
  }
  const counts = names.map((name) => observed[name] ?? 0);
  const total = counts.reduce((a, b) => a + b, 0);
  if (total === 0) throw new GeneticsError('evidence', 'observed', 'Nothing has been observed.');
  const impossible = counts.some((count, i) => count > 0 && chances[i]?.equals(ZERO));
  const kept = chances
    .map((chance, i) => ({ chance, count: counts[i] ?? 0 }))
    .filter(({ chance }) => chance.gt(0));
  const degreesOfFreedom = kept.length - 1;
  const chiSquared = impossible
    ? null
    : sum(
        kept.map(({ chance, count }) => {
          const mean = chance.mul(total);
          return mean.sub(count).pow(2).div(mean);
        }),
      );
  return {
    chiSquared,
    degreesOfFreedom,
    chiSquaredPValue: chiSquared ? chiSquaredTail(chiSquared.valueOf(), degreesOfFreedom) : 0,
    exactPValue: impossible ? ZERO : exactMultinomial(kept, total, mostOutcomes),
    smallestExpected: Math.min(...kept.map(({ chance }) => chance.mul(total).valueOf())),
  };
}

function exactMultinomial(
  classes: readonly { chance: Fraction; count: number }[],
  total: number,
  mostOutcomes: number,
): Fraction | null {
  // Number of outcomes: C(total + k − 1, k − 1).
  let outcomes = 1;
  for (let i = 1; i < classes.length; i += 1) outcomes = (outcomes * (total + i)) / i;
  if (outcomes > mostOutcomes) return null;
  // Over a common denominator every likelihood is an integer over the same number, so comparison is exact.
  const denominator = classes.reduce((common, { chance }) => common.lcm(new Fraction(chance.d)), ONE);
  const weights = classes.map(({ chance }) =>
    chance.mul(denominator).valueOf() ? chance.mul(denominator).n : 0n,
  );
  const factorials: bigint[] = [1n];
  for (let i = 1; i <= total; i += 1) factorials.push((factorials[i - 1] ?? 1n) * BigInt(i));
  const choose = (n: number, k: number) =>
    (factorials[n] ?? 1n) / ((factorials[k] ?? 1n) * (factorials[n - k] ?? 1n));
  let left = total;
  let seen = 1n;
  classes.forEach(({ count }, i) => {
    seen *= choose(left, count) * (weights[i] ?? 0n) ** BigInt(count);
    left -= count;
  });
  let tail = 0n;
  const visit = (index: number, remaining: number, likelihood: bigint) => {
    const weight = weights[index] ?? 0n;
    if (index === weights.length - 1) {
      const whole = likelihood * weight ** BigInt(remaining);
      if (whole <= seen) tail += whole;
      return;
    }
    let power = 1n;
    for (let count = 0; count <= remaining; count += 1) {
      visit(index + 1, remaining - count, likelihood * choose(remaining, count) * power);
      power *= weight;
    }
  };
  visit(0, total, 1n);
  return new Fraction(tail, denominator.n ** BigInt(total));
}

/**
 * Chance that a χ² variable is at least so large: the regularised upper incomplete gamma function Q(k/2, x/2), by its
 * series or continued fraction (Abramowitz and Stegun 6.5.29 and 6.5.31).
 * @param degreesOfFreedom 0 or more; for 0 the result is 1
 */
export function chiSquaredTail(value: number, degreesOfFreedom: number): number {
  if (degreesOfFreedom <= 0 || value <= 0) return 1;
  const a = degreesOfFreedom / 2;
  const x = value / 2;
  const front = Math.exp(-x + a * Math.log(x) - logGammaOfHalves(degreesOfFreedom));
  if (x < a + 1) {
    let term = 1 / a;
    let series = term;
    for (let n = 1; n < 10_000 && term > series * 1e-17; n += 1) {
      term *= x / (a + n);
      series += term;
    }
    return Math.max(0, 1 - front * series);
  }
  // Modified Lentz's method for the continued fraction.
  let b = x + 1 - a;
  let c = 1e300;
  let d = 1 / b;
  let fraction = d;
  for (let n = 1; n < 10_000; n += 1) {
    const step = -n * (n - a);
    b += 2;
    d = 1 / (step * d + b);
    c = b + step / c;
    fraction *= d * c;
    if (Math.abs(d * c - 1) < 1e-16) break;
  }
  return front * fraction;
}

/** ln Γ(k/2) for whole k ≥ 1, by the recurrence from Γ(1/2) = √π and Γ(1) = 1. */
function logGammaOfHalves(k: number): number {
  let log = k % 2 === 1 ? Math.log(Math.PI) / 2 : 0;
  for (let half = k % 2 === 1 ? 1 : 2; half < k; half += 2) log += Math.log(half / 2);
  return log;
}

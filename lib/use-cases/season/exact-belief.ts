import Fraction from 'fraction.js';
import { fromNumbers, type Belief } from '@/lib/genetics/belief';
import type { GenotypeOdds } from '../genetics/species-beliefs';

/** Doubles this close to a simple fraction are taken for it: odds of a few generations have small denominators. */
const CLOSE = 1e-10;

/**
 * The exact belief that inferred doubles stand for: 0.666… is 2/3 again, so that odds can be told as fractions. Where
 * simple fractions do not add up to 1 the doubles are rounded to millionths instead.
 */
export function exactBelief(genotypes: readonly GenotypeOdds[]): Belief {
  const simple = new Map(
    genotypes.map(({ genotype, probability }) => [genotype, new Fraction(probability).simplify(CLOSE)]),
  );
  const total = [...simple.values()].reduce((sum, chance) => sum.add(chance), new Fraction(0));
  if (total.equals(1)) return new Map([...simple].filter(([, chance]) => chance.gt(0)));
  return fromNumbers(new Map(genotypes.map(({ genotype, probability }) => [genotype, probability])));
}

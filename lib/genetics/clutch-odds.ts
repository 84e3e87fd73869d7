import type Fraction from 'fraction.js';
import { SEXES, type Cross, type KnownSex } from './cross';
import { HALF, ONE, sum, ZERO } from './fractions';
import { GeneticsError } from './genetics-error';
import { phenotypeChances } from './genotype';
import type { Phenotype } from './locus';

/** Which young are asked for. */
export interface WantedYoung {
  /** Phenotype by locus id ('' is normal); loci that are left out may show anything. */
  phenotype: Readonly<Record<string, Phenotype>>;
  sex?: KnownSex;
}

/**
 * How likely a single fertile egg is wanted, as a distribution over the parents' genotypes. All eggs of a clutch share
 * their parents, so odds of a clutch are averaged over this, not computed from its mean.
 * @returns chances per egg with their weights, which add up to 1
 * @throws {GeneticsError} 'evidence' for an unknown locus, or a sex where sex is not decided by chromosomes
 */
export function eggChances(cross: Cross, wanted: WantedYoung): { chance: Fraction; weight: Fraction }[] {
  for (const id of Object.keys(wanted.phenotype)) {
    if (!cross.loci.some((locus) => locus.id === id)) {
      throw new GeneticsError('evidence', id, `"${id}" is no locus of this cross.`);
    }
  }
  if (wanted.sex && (cross.sexSystem === 'TSD' || cross.sexSystem === 'unknown')) {
    throw new GeneticsError(
      'evidence',
      wanted.sex,
      'The sex of the young does not follow from the parents in this species.',
    );
  }
  // Chance per sex and weight of each distinct product over the blocks seen so far.
  let states = new Map<string, { male: Fraction; female: Fraction; weight: Fraction }>([
    ['', { male: ONE, female: ONE, weight: ONE }],
  ]);
  for (const block of cross.blocks) {
    const next: typeof states = new Map();
    for (const { weight, eggs } of block.parentStates) {
      const matching = Object.fromEntries(
        SEXES.map((sex) => [
          sex,
          sum(
            eggs[sex]
              .filter(({ lethal }) => !lethal)
              .map(({ genotypes, chance }) =>
                block.loci.reduce((product, locus, i) => {
                  const phenotype = wanted.phenotype[locus.id];
                  if (phenotype === undefined) return product;
                  return product.mul(phenotypeChances(locus, genotypes[i] ?? '').get(phenotype) ?? ZERO);
                }, chance),
              ),
          ),
        ]),
      ) as Record<KnownSex, Fraction>;
      for (const state of states.values()) {
        const male = state.male.mul(matching.male);
        const female = state.female.mul(matching.female);
        const key = `${male.toFraction()} ${female.toFraction()}`;
        const before = next.get(key)?.weight ?? ZERO;
        next.set(key, { male, female, weight: before.add(state.weight.mul(weight)) });
      }
    }
    states = next;
  }
  return [...states.values()].map(({ male, female, weight }) => ({
    weight,
    chance: HALF.mul(wanted.sex === 'male' ? male : wanted.sex === 'female' ? female : male.add(female)),
  }));
}

/** Chance of at least k successes in n independent trials. */
function binomialTail(n: number, k: number, p: Fraction): Fraction {
  if (k <= 0) return ONE;
  if (k > n) return ZERO;
  const q = ONE.sub(p);
  let below = ZERO;
  let choose = ONE;
  for (let i = 0; i < k; i += 1) {
    below = below.add(choose.mul(p.pow(i)).mul(q.pow(n - i)));
    choose = choose.mul(n - i).div(i + 1);
  }
  return ONE.sub(below);
}

/**
 * Exact chance that at least so many eggs of a clutch become wanted young. A mixture over the parents' genotypes: a
 * certain carrier with a two-in-three carrier gives a visual in six eggs with 2/3·(1 − (3/4)⁶), not 1 − (5/6)⁶.
 * @param clutch number of eggs (0 or more), or chance per number of eggs, adding up to 1
 * @param hatchRate chance that an egg which does not die of its genotype hatches; 1 if left out
 */
export function chanceInClutch(
  cross: Cross,
  wanted: WantedYoung,
  clutch: number | ReadonlyMap<number, Fraction>,
  atLeast = 1,
  hatchRate: Fraction = ONE,
): Fraction {
  const sizes = typeof clutch === 'number' ? new Map([[clutch, ONE]]) : clutch;
  for (const size of sizes.keys()) {
    if (!Number.isInteger(size) || size < 0 || size > 200) {
      throw new GeneticsError('too-large', 'clutch', `A clutch has 0 to 200 eggs, not ${size}.`);
    }
  }
  return sum(
    eggChances(cross, wanted).flatMap(({ chance, weight }) =>
      [...sizes].map(([size, p]) => binomialTail(size, atLeast, chance.mul(hatchRate)).mul(p).mul(weight)),
    ),
  );
}

/**
 * The same for at least one, in doubles, for tables with many rows.
 * @param chances per fertile egg, with weights, as {@link eggChances} gives them
 */
export function chanceOfAny(
  chances: readonly { chance: number; weight: number }[],
  clutch: ReadonlyMap<number, number>,
  hatchRate: number,
): number {
  let none = 0;
  for (const { chance, weight } of chances) {
    for (const [size, p] of clutch) none += weight * p * (1 - chance * hatchRate) ** size;
  }
  return Math.min(1, Math.max(0, 1 - none));
}

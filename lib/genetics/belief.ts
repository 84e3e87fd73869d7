import Fraction from 'fraction.js';
import { ONE, parseProbability, sum, ZERO } from './fractions';
import { GeneticsError } from './genetics-error';
import {
  allelesOf,
  copiesOf,
  genotypesOf,
  isMutant,
  joinAlleles,
  normaliseGenotype,
  phenotypeChances,
} from './genotype';
import {
  NORMAL,
  type Genotype,
  type LocusDefinition,
  type Phenotype,
  type ProbabilityText,
  type Sex,
  type SexSystem,
} from './locus';

/** What is thought of one animal at one locus: chance per genotype, adding up to exactly 1; impossible ones left out. */
export type Belief = ReadonlyMap<Genotype, Fraction>;

/** The same in doubles, as inference gives it. */
export type NumericBelief = ReadonlyMap<Genotype, number>;

/** What somebody says of an animal at one locus. */
export type Statement =
  /** It looks so; '' is normal. */
  | { kind: 'shows'; phenotype: Phenotype }
  /** It carries one copy of the allele for sure ("het", "100 % het") or with a chance ("66 % het" is 2/3). */
  | { kind: 'het'; allele: string; probability: ProbabilityText }
  /** Chance per genotype, adding up to 1. */
  | { kind: 'genotypes'; genotypes: Readonly<Record<Genotype, ProbabilityText>> };

/** A belief in a single genotype. */
export function certainly(genotype: Genotype): Belief {
  return new Map([[genotype, ONE]]);
}

/** The genotype without any mutant allele. */
export function wildGenotype(locus: LocusDefinition, sex: Sex, system: SexSystem): Genotype {
  const wild = locus.alleles[0]?.symbol ?? '+';
  return joinAlleles(
    locus,
    new Array<string>(copiesOf(locus, sex === 'unknown' ? 'female' : sex, system)).fill(wild),
  );
}

/**
 * Reads a belief from text fractions.
 * @throws {GeneticsError} 'unknown-allele', 'genotype' or 'probability' (also when they do not add up to 1)
 */
export function readBelief(
  locus: LocusDefinition,
  sex: Sex,
  system: SexSystem,
  genotypes: Readonly<Record<Genotype, ProbabilityText>>,
): Belief {
  const belief = new Map<Genotype, Fraction>();
  for (const [written, text] of Object.entries(genotypes)) {
    const genotype = normaliseGenotype(locus, written, sex, system);
    belief.set(genotype, (belief.get(genotype) ?? ZERO).add(parseProbability(text, locus.id)));
  }
  const total = sum(belief.values());
  if (!total.equals(ONE)) {
    throw new GeneticsError(
      'probability',
      locus.id,
      `The chances at ${locus.name} add up to ${total.toFraction()}, not 1.`,
    );
  }
  return withoutZeros(belief);
}

/**
 * A belief from what is said of the animal alone, without its relatives.
 *
 * Without a statement of genotypes the trade's convention holds: what shows nothing and is not said to carry anything
 * is wild type, and what shows something has the fewest mutant alleles that show it, evenly where there are several
 * (the limit of Hardy–Weinberg odds as the mutant becomes rare). Contradicting statements are refused.
 * @throws {GeneticsError} 'evidence' when no genotype fits all statements; also as {@link readBelief}
 */
export function beliefFromStatements(
  locus: LocusDefinition,
  sex: Sex,
  system: SexSystem,
  statements: readonly Statement[],
): Belief {
  let belief: Belief | null = null;
  for (const statement of statements) {
    if (statement.kind === 'genotypes') belief = readBelief(locus, sex, system, statement.genotypes);
    if (statement.kind === 'het')
      belief = hetBelief(locus, sex, system, statement.allele, statement.probability);
  }
  const shows = statements.flatMap((statement) => (statement.kind === 'shows' ? [statement.phenotype] : []));
  if (!belief) {
    const seen = shows[0] ?? NORMAL;
    belief = rarestThatShows(locus, sex, system, seen);
  }
  for (const phenotype of shows) belief = conditionOnPhenotype(locus, belief, phenotype);
  return belief;
}

function hetBelief(
  locus: LocusDefinition,
  sex: Sex,
  system: SexSystem,
  allele: string,
  probability: string,
): Belief {
  const wild = wildGenotype(locus, sex, system);
  const carrier = joinAlleles(locus, [...allelesOf(wild).slice(1), allele]);
  const chance = parseProbability(probability, locus.id);
  return withoutZeros(
    new Map([
      [wild, ONE.sub(chance)],
      [carrier, chance],
    ]),
  );
}

function rarestThatShows(locus: LocusDefinition, sex: Sex, system: SexSystem, phenotype: Phenotype): Belief {
  const wild = locus.alleles[0]?.symbol;
  const mutants = (genotype: Genotype) => allelesOf(genotype).filter((symbol) => symbol !== wild).length;
  const showing = genotypesOf(locus, sex, system).filter(
    (genotype) =>
      !locus.lethal.includes(genotype) && (phenotypeChances(locus, genotype).get(phenotype) ?? ZERO).gt(0),
  );
  if (showing.length === 0) {
    throw new GeneticsError(
      'evidence',
      locus.id,
      `No genotype of ${locus.name} shows "${phenotype || 'normal'}".`,
    );
  }
  const fewest = Math.min(...showing.map(mutants));
  const kept = showing.filter((genotype) => mutants(genotype) === fewest);
  return new Map(kept.map((genotype) => [genotype, new Fraction(1, kept.length)]));
}

/**
 * Bayes' rule: the belief once the phenotype is seen.
 * @throws {GeneticsError} 'evidence' when no genotype of the belief shows it
 */
export function conditionOnPhenotype(locus: LocusDefinition, belief: Belief, phenotype: Phenotype): Belief {
  const weighted = new Map<Genotype, Fraction>();
  for (const [genotype, chance] of belief) {
    weighted.set(genotype, chance.mul(phenotypeChances(locus, genotype).get(phenotype) ?? ZERO));
  }
  const total = sum(weighted.values());
  if (total.equals(ZERO)) {
    throw new GeneticsError(
      'evidence',
      locus.id,
      `"${phenotype || 'normal'}" at ${locus.name} contradicts ${[...belief.keys()].join(', ')}.`,
    );
  }
  return withoutZeros(new Map([...weighted].map(([genotype, weight]) => [genotype, weight.div(total)])));
}

/** Chance of at least one copy of an allele, or of any mutant allele when none is named. */
export function chanceOfCarrying(locus: LocusDefinition, belief: Belief, allele?: string): Fraction {
  return sum(
    [...belief]
      .filter(([genotype]) =>
        allele === undefined ? isMutant(locus, genotype) : allelesOf(genotype).includes(allele),
      )
      .map(([, chance]) => chance),
  );
}

/** Doubles for an exact belief. */
export function toNumbers(belief: Belief): NumericBelief {
  return new Map([...belief].map(([genotype, chance]) => [genotype, chance.valueOf()]));
}

/**
 * An exact belief from inferred doubles, so that crosses can be computed from it: rounded to millionths, the likeliest
 * genotype taking up the rounding.
 */
export function fromNumbers(belief: NumericBelief): Belief {
  const million = 1_000_000;
  const whole = [...belief].map(([genotype, chance]) => ({ genotype, parts: Math.round(chance * million) }));
  const likeliest = whole.reduce((best, entry) => (entry.parts > best.parts ? entry : best));
  likeliest.parts += million - whole.reduce((total, { parts }) => total + parts, 0);
  return withoutZeros(new Map(whole.map(({ genotype, parts }) => [genotype, new Fraction(parts, million)])));
}

function withoutZeros(belief: Belief): Belief {
  return new Map([...belief].filter(([, chance]) => chance.gt(0)));
}

import { GeneticsError } from '../genetics-error';
import { allelesOf, isLethal, normaliseGenotype, phenotypeChances, phenotypesOf } from '../genotype';
import type { Genotype, LocusDefinition, Sex, SexSystem } from '../locus';
import type { Evidence } from './pedigree-input';

function checkChance(value: number, evidence: Evidence, what: string): number {
  if (value >= 0 && value <= 1) return value;
  throw new GeneticsError(
    'probability',
    evidence.animal,
    `The ${what} of ${evidence.animal} is ${value}, not from 0 to 1.`,
  );
}

function readChances(
  locus: LocusDefinition,
  sex: Sex,
  system: SexSystem,
  evidence: Evidence & { genotypes: Readonly<Record<Genotype, number>> },
): Map<Genotype, number> {
  const chances = new Map<Genotype, number>();
  for (const [written, chance] of Object.entries(evidence.genotypes)) {
    const genotype = normaliseGenotype(locus, written, sex, system);
    chances.set(genotype, (chances.get(genotype) ?? 0) + checkChance(chance, evidence, 'chance'));
  }
  const total = [...chances.values()].reduce((a, b) => a + b, 0);
  if (Math.abs(total - 1) > 1e-9) {
    throw new GeneticsError(
      'probability',
      evidence.animal,
      `The chances of ${evidence.animal} at ${locus.name} add up to ${total}, not 1.`,
    );
  }
  return chances;
}

/**
 * Probability of the evidence for each genotype, up to a factor.
 * @param genotypes the animal's possible genotypes
 */
function weightOf(
  locus: LocusDefinition,
  sex: Sex,
  system: SexSystem,
  genotypes: readonly Genotype[],
  evidence: Evidence,
): number[] {
  switch (evidence.kind) {
    case 'phenotype': {
      const wrong = checkChance(evidence.mislabelling ?? 0, evidence, 'mislabelling rate');
      const known = phenotypesOf(locus);
      if (!known.includes(evidence.phenotype)) {
        throw new GeneticsError(
          'evidence',
          evidence.animal,
          `${locus.name} cannot show "${evidence.phenotype || 'normal'}" (${evidence.animal}).`,
        );
      }
      return genotypes.map((genotype) => {
        const right = phenotypeChances(locus, genotype).get(evidence.phenotype)?.valueOf() ?? 0;
        return (1 - wrong) * right + wrong / known.length;
      });
    }
    case 'test': {
      const found = normaliseGenotype(locus, evidence.genotype, sex, system);
      const error = checkChance(evidence.error, evidence, 'error');
      const others = (genotype: Genotype) => {
        const copies = allelesOf(genotype).length;
        return genotypes.filter((other) => allelesOf(other).length === copies).length - 1;
      };
      return genotypes.map((genotype) =>
        genotype === found ? 1 - error : error / Math.max(1, others(genotype)),
      );
    }
    case 'prior': {
      const chances = readChances(locus, sex, system, evidence);
      return genotypes.map((genotype) => chances.get(genotype) ?? 0);
    }
    case 'statement': {
      const chances = readChances(locus, sex, system, evidence);
      const sure = checkChance(evidence.confidence, evidence, 'confidence');
      return genotypes.map((genotype) => sure * (chances.get(genotype) ?? 0) + (1 - sure) / genotypes.length);
    }
  }
}

/** Hardy–Weinberg chance of a genotype. */
export function hardyWeinberg(
  locus: LocusDefinition,
  frequencies: readonly number[],
  genotype: Genotype,
): number {
  const [first = 0, second] = allelesOf(genotype).map((allele) =>
    locus.alleles.findIndex(({ symbol }) => symbol === allele),
  );
  const p = frequencies[first] ?? 0;
  if (second === undefined) return p;
  return p * (frequencies[second] ?? 0) * (first === second ? 1 : 2);
}

/**
 * All that is known of one animal at one locus, as a weight per genotype. Every animal listed has lived, so genotypes
 * that die in the egg weigh nothing. For a founder the prior is included.
 */
export function localWeights(
  locus: LocusDefinition,
  sex: Sex,
  system: SexSystem,
  genotypes: readonly Genotype[],
  evidence: readonly Evidence[],
  founderFrequencies: readonly number[] | null,
): number[] {
  let prior: number[] = genotypes.map((genotype) => (isLethal(locus, genotype) ? 0 : 1));
  const multiply = (weights: readonly number[]) => {
    prior = prior.map((weight, i) => weight * (weights[i] ?? 0));
  };
  if (founderFrequencies) {
    const stated = evidence.filter((entry) => entry.kind === 'prior' || entry.kind === 'statement');
    let own = genotypes.map((genotype) => hardyWeinberg(locus, founderFrequencies, genotype));
    for (const entry of stated) {
      const chances = readChances(locus, sex, system, entry);
      const sure = entry.kind === 'prior' ? 1 : checkChance(entry.confidence, entry, 'confidence');
      own = own.map((weight, i) => sure * (chances.get(genotypes[i] ?? '') ?? 0) + (1 - sure) * weight);
    }
    multiply(own);
    for (const entry of evidence) {
      if (!stated.some((other) => other === entry)) multiply(weightOf(locus, sex, system, genotypes, entry));
    }
    return prior;
  }
  for (const entry of evidence) multiply(weightOf(locus, sex, system, genotypes, entry));
  return prior;
}

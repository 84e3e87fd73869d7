import { carriedAlleles, carriedWords } from '@/lib/genetics/describe';
import { allelesOf, isMutant, phenotypeChances } from '@/lib/genetics/genotype';
import { NORMAL } from '@/lib/genetics/locus';
import type { BeliefLocus, LocusBelief, SpeciesBeliefs } from './species-beliefs';

/** What is left of rounding once probabilities have been added up. */
const CERTAIN = 1 - 1e-9;

function locusOf(species: Pick<SpeciesBeliefs, 'loci'>, belief: LocusBelief): BeliefLocus {
  const locus = species.loci.find(({ id }) => id === belief.locusId);
  if (!locus) throw new RangeError(`No locus ${belief.locusId} in this species.`);
  return locus;
}

/** Probability of at least one copy of an allele other than the wild type; 0 and 1 exactly when certain. */
export function carriesProbability(species: Pick<SpeciesBeliefs, 'loci'>, belief: LocusBelief): number {
  const { definition } = locusOf(species, belief);
  const carries = belief.genotypes.reduce(
    (sum, { genotype, probability }) => sum + (isMutant(definition, genotype) ? probability : 0),
    0,
  );
  return carries > CERTAIN ? 1 : carries < 1e-9 ? 0 : carries;
}

/** Whether something other than normal is recorded as seen, or follows for certain. */
export function isShown(species: Pick<SpeciesBeliefs, 'loci'>, belief: LocusBelief): boolean {
  if (belief.shows !== null) return belief.shows !== NORMAL;
  const { definition } = locusOf(species, belief);
  return (
    belief.genotypes.length > 0 &&
    belief.genotypes.every(({ genotype }) => !phenotypeChances(definition, genotype).has(NORMAL))
  );
}

/** The two parental copies as they are drawn: the left half is the second copy, the right one the first. */
export function drawnCopies(
  species: Pick<SpeciesBeliefs, 'loci'>,
  belief: LocusBelief,
): {
  copies: [{ letter: string; probability: number }, { letter: string; probability: number }];
  single: boolean;
} {
  const { definition } = locusOf(species, belief);
  const wild = definition.alleles[0]?.symbol ?? '+';
  const single =
    belief.genotypes.length > 0 && belief.genotypes.every(({ genotype }) => allelesOf(genotype).length === 1);
  const mutants = belief.genotypes.map(({ genotype, probability }) => ({
    found: allelesOf(genotype).filter((symbol) => symbol !== wild),
    probability,
  }));
  const half = (copies: number) => {
    const with_ = mutants.filter(({ found }) => found.length >= copies);
    const probability = with_.reduce((sum, one) => sum + one.probability, 0);
    const letter =
      probability > 0 ? (with_[0]?.found[copies === 2 ? 0 : with_[0].found.length - 1] ?? wild) : wild;
    return { letter, probability: probability > CERTAIN ? 1 : probability < 1e-9 ? 0 : probability };
  };
  return { copies: [half(2), half(1)], single };
}

/** What is thought of a locus in words beside the drawing: how it looks, and what it has beyond what its looks tell. */
export function wordsOf(species: Pick<SpeciesBeliefs, 'loci'>, belief: LocusBelief): string {
  const { definition } = locusOf(species, belief);
  if (belief.genotypes.length === 0) return 'not known';
  const looks = belief.shows ?? impliedLook(species, belief);
  const odds = new Map(belief.genotypes.map(({ genotype, probability }) => [genotype, probability]));
  const beyond = carriedAlleles(definition, looks, odds).map((carried) =>
    // The line names the locus already; an allele of a series is named in full.
    definition.alleles.length > 2 ? carriedWords(carried) : carriedWords({ ...carried, name: '' }).trim(),
  );
  if (looks === NORMAL && beyond.length === 0) return 'no copy';
  return [looks, ...beyond].filter(Boolean).join(', ');
}

/** What all of its possible genotypes show, where that is one and the same. */
function impliedLook(species: Pick<SpeciesBeliefs, 'loci'>, belief: LocusBelief): string {
  const { definition } = locusOf(species, belief);
  const looks = new Set(
    belief.genotypes.flatMap(({ genotype }) => [...phenotypeChances(definition, genotype).keys()]),
  );
  const [only] = looks;
  return looks.size === 1 ? (only ?? NORMAL) : NORMAL;
}

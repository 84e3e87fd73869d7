import type { NumericBelief } from '../belief';
import { isMutant } from '../genotype';
import type { LocusDefinition } from '../locus';
import { inferPedigree } from './infer';
import type { Evidence, PedigreeInput } from './pedigree-input';

/** One step of a reason: what was taken into account, and what was believed after it. */
export interface ReasonStep {
  about: 'ancestors' | 'own' | 'descendants';
  text: string;
  belief: NumericBelief;
  /** Chance of at least one mutant allele after this step, 0 to 1. */
  chanceOfCarrying: number;
}

/**
 * Why an animal is believed to carry what it does: the chance from its ancestors and its relatives alone, then with what is
 * seen and said of itself, then with its descendants. The last step is the full posterior at this locus.
 * @throws {GeneticsError} as `inferPedigree`
 */
export function explainBelief(input: PedigreeInput, animal: string, locus: LocusDefinition): ReasonStep[] {
  const descendants = descendantsOf(input, animal);
  const atLocus = input.evidence.filter((entry) => entry.locus === locus.id);
  const infer = (evidence: readonly Evidence[]): NumericBelief =>
    inferPedigree({ ...input, loci: [locus], evidence })
      .beliefs.get(locus.id)
      ?.get(animal) ?? new Map();
  const relatives = atLocus.filter((entry) => entry.animal !== animal && !descendants.has(entry.animal));
  const own = atLocus.filter((entry) => entry.animal === animal);
  const below = atLocus.filter((entry) => descendants.has(entry.animal));

  const fromRelatives = infer(relatives);
  const member = input.animals.find(({ id }) => id === animal);
  const founder = member?.dam == null && member?.sire == null && !member?.sires;
  const steps = [
    step(
      locus,
      'ancestors',
      fromRelatives,
      founder ? 'Its parents are not known' : `From its parents and other relatives`,
    ),
  ];
  if (own.length > 0) {
    const withOwn = infer([...relatives, ...own]);
    steps.push(
      step(locus, 'own', withOwn, `${own.map(ownWords).join('; ')}${ruledOut(fromRelatives, withOwn)}`),
    );
  }
  if (below.length > 0) {
    const seen = new Set(below.map((entry) => entry.animal)).size;
    steps.push(
      step(locus, 'descendants', infer(atLocus), `With what is known of ${seen} of its descendants`),
    );
  }
  return steps;
}

function step(
  locus: LocusDefinition,
  about: ReasonStep['about'],
  belief: NumericBelief,
  reason: string,
): ReasonStep {
  const chanceOfCarrying = [...belief].reduce(
    (sum, [genotype, p]) => sum + (isMutant(locus, genotype) ? p : 0),
    0,
  );
  const ways = [...belief]
    .toSorted((a, b) => b[1] - a[1])
    .map(([genotype, p]) => `${genotype} ${percent(p)}`)
    .join(', ');
  return { about, belief, chanceOfCarrying, text: `${reason}: ${ways || 'nothing is possible'}.` };
}

function ruledOut(before: NumericBelief, after: NumericBelief): string {
  const gone = [...before.keys()].filter((genotype) => !after.has(genotype));
  return gone.length > 0 ? `, which rules out ${gone.join(', ')}` : '';
}

function ownWords(entry: Evidence): string {
  switch (entry.kind) {
    case 'phenotype':
      return `It looks ${entry.phenotype || 'normal'}`;
    case 'test':
      return `A test found ${entry.genotype} (error ${percent(entry.error)})`;
    case 'prior':
      return 'Its genotype is recorded';
    case 'statement':
      return `It is stated with ${percent(entry.confidence)} confidence`;
  }
}

function percent(p: number): string {
  return `${(100 * p).toFixed(1).replace(/\.0$/, '')} %`;
}

function descendantsOf({ animals }: PedigreeInput, ancestor: string): Set<string> {
  const youngOf = new Map<string, string[]>();
  for (const { id, sire, dam, sires } of animals) {
    for (const parent of [sire, dam, ...Object.keys(sires ?? {})]) {
      if (parent != null) youngOf.set(parent, [...(youngOf.get(parent) ?? []), id]);
    }
  }
  const found = new Set<string>();
  const open = [ancestor];
  for (let id = open.pop(); id !== undefined; id = open.pop()) {
    for (const young of youngOf.get(id) ?? []) {
      if (found.has(young)) continue;
      found.add(young);
      open.push(young);
    }
  }
  return found;
}

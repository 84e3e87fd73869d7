import { GeneticsError } from '../genetics-error';
import { inferPedigree } from './infer';
import type { Evidence, PedigreeInput, PedigreeMember } from './pedigree-input';

/** A record that takes part in a contradiction: a thing said or seen of an animal, or a parentage. */
export type SuspectRecord =
  | { kind: 'evidence'; animal: string; evidence: Evidence }
  | { kind: 'sire' | 'dam'; animal: string; parent: string };

/** A record that may be the mistake. */
export interface Suspicion {
  record: SuspectRecord;
  /** "x may not be the sire of y", in plain words. */
  text: string;
  /** Chance (0 to 1) that this is the wrong one, if exactly one is; see `explainContradiction`. */
  probability: number;
}

export interface Contradiction {
  /** These cannot all be true, and any smaller part of them can. */
  records: readonly SuspectRecord[];
  /** The likeliest mistake first. */
  suspicions: readonly Suspicion[];
}

/**
 * How often a record of each kind is wrong before anything is seen; only their ratios count. Common practice, no
 * source: looks are seldom misjudged, sires more often than dams, statements most often.
 */
export const MISTAKE_RATES: Readonly<Record<SuspectRecord['kind'] | Evidence['kind'], number>> = {
  phenotype: 0.01,
  test: 0.005,
  prior: 0.03,
  statement: 0.05,
  sire: 0.03,
  dam: 0.005,
  evidence: 0.01,
};

/**
 * Finds a minimal set of records behind impossible evidence: everything is kept, then whole blocks and at last single
 * records are dropped as long as the rest stays impossible (so no record of the result can be spared), starting where
 * the records are most. The suspicions weigh how often such a record is wrong with the probability of all other evidence
 * once it is taken away.
 * @returns null when the evidence is possible
 */
export function explainContradiction(input: PedigreeInput): Contradiction | null {
  if (!isImpossible(input)) return null;
  const all: SuspectRecord[] = [
    ...input.animals.flatMap((animal): SuspectRecord[] => [
      ...(animal.sire == null || animal.sires || animal.parthenogenetic
        ? []
        : [{ kind: 'sire', animal: animal.id, parent: animal.sire } as const]),
      ...(animal.dam == null || animal.parthenogenetic
        ? []
        : [{ kind: 'dam', animal: animal.id, parent: animal.dam } as const]),
    ]),
    ...input.evidence.map((evidence) => ({ kind: 'evidence', animal: evidence.animal, evidence }) as const),
  ];
  let kept = all;
  for (let size = Math.ceil(all.length / 2); size >= 1; size = size === 1 ? 0 : Math.ceil(size / 2)) {
    for (let at = 0; at < kept.length;) {
      const fewer = [...kept.slice(0, at), ...kept.slice(at + size)];
      if (isImpossible(withRecords(input, fewer))) kept = fewer;
      else at += size;
    }
  }
  const weights = kept.map((record) => {
    const rest = kept.filter((each) => each !== record);
    const rate =
      record.kind === 'evidence' ? MISTAKE_RATES[record.evidence.kind] : MISTAKE_RATES[record.kind];
    return rate * Math.exp(inferPedigree(withRecords(input, rest)).logLikelihood);
  });
  const total = weights.reduce((a, b) => a + b, 0);
  const suspicions = kept
    .map((record, i) => ({
      record,
      text: words(record),
      probability: total > 0 ? (weights[i] ?? 0) / total : 0,
    }))
    .toSorted((a, b) => b.probability - a.probability);
  return { records: kept, suspicions };
}

function isImpossible(input: PedigreeInput): boolean {
  return inferPedigree(input).impossible;
}

/** The pedigree with only these records; without them a parent is unknown and nothing is said. */
function withRecords(input: PedigreeInput, records: readonly SuspectRecord[]): PedigreeInput {
  const sires = new Set(records.filter(({ kind }) => kind === 'sire').map(({ animal }) => animal));
  const dams = new Set(records.filter(({ kind }) => kind === 'dam').map(({ animal }) => animal));
  // A parent that is no longer named stays what its evidence says it is.
  const animals = input.animals.map((animal): PedigreeMember => {
    const plain = !animal.sires && !animal.parthenogenetic;
    return {
      ...animal,
      ...(plain && !sires.has(animal.id) ? { sire: null } : {}),
      ...(!animal.parthenogenetic && !dams.has(animal.id) ? { dam: null } : {}),
    };
  });
  const listed = new Set(animals.map(({ id }) => id));
  const named = input.animals.flatMap((animal): PedigreeMember[] => [
    ...(animal.sire != null && !listed.has(animal.sire) ? [{ id: animal.sire, sex: 'male' } as const] : []),
    ...(animal.dam != null && !listed.has(animal.dam) ? [{ id: animal.dam, sex: 'female' } as const] : []),
  ]);
  const added = [...new Map(named.map((member) => [member.id, member])).values()];
  const evidence = records.flatMap((record) => (record.kind === 'evidence' ? [record.evidence] : []));
  return { ...input, animals: [...animals, ...added], evidence };
}

function words(record: SuspectRecord): string {
  if (record.kind !== 'evidence')
    return `${record.parent} may not be the ${record.kind} of ${record.animal}.`;
  const { evidence, animal } = record;
  switch (evidence.kind) {
    case 'phenotype':
      return `${animal} may not be ${evidence.phenotype || 'normal'}, or it may be another animal.`;
    case 'test':
      return `The test of ${animal} may be wrong.`;
    case 'prior':
    case 'statement':
      return `What is stated of ${animal} may be wrong.`;
    default:
      throw new GeneticsError('evidence', animal, 'Unknown kind of evidence.');
  }
}

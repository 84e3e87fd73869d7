import type { PairingFigures, ParentFigures } from '@/lib/contracts/pairing-figures';
import type { SpeciesProfile } from '@/lib/contracts/species';
import type { WorkspaceLimits } from '@/lib/contracts/workspace';
import { checkReadiness, type BreedingLimit } from '@/lib/season/readiness';
import type { RelationFigures } from './relation-figures';

type Warning = PairingFigures['warnings'][number];
export interface PastRefusal {
  sireId: string;
  damId: string;
  sireCode: string;
  damCode: string;
  seenOn: string;
}

/** The limits of age and weight that hold for a sex: the workspace's own and the species'. */
export function limitsFor(
  sex: 'male' | 'female',
  limits: WorkspaceLimits,
  { breeding }: SpeciesProfile,
): BreedingLimit[] {
  return [
    {
      grams: limits.minimumBreedingGrams[sex],
      months: limits.minimumBreedingMonths[sex],
      from: 'the workspace',
    },
    {
      grams: sex === 'male' ? breeding.maleGrams : breeding.femaleGrams,
      months: sex === 'male' ? breeding.maleMonths : breeding.femaleMonths,
      from: 'the species',
    },
  ];
}

/** What speaks against a pairing: age, weight, past refusals, relation. None of it forbids. */
export function pairWarnings(
  { sire, dam }: PairingFigures['parents'],
  {
    limits,
    profile,
    onDay,
    relation,
    refusals,
  }: {
    limits: WorkspaceLimits;
    profile: SpeciesProfile;
    onDay: string;
    relation: RelationFigures;
    refusals: readonly PastRefusal[];
  },
): Warning[] {
  const ready = (parent: ParentFigures, sex: 'male' | 'female') =>
    checkReadiness({ ...parent, sex }, limitsFor(sex, limits, profile), onDay);
  const together = refusals.filter((one) => one.sireId === sire.id && one.damId === dam.id);
  const others = refusals.filter((one) => !together.includes(one)).slice(0, 2);
  const warnings: Warning[] = [...ready(sire, 'male'), ...ready(dam, 'female')];
  if (together[0])
    warnings.push({
      about: 'refusal',
      text: `${sire.code} and ${dam.code} refused to pair ${together.length === 1 ? 'once' : `${together.length} times`}, last on ${together[0].seenOn}.`,
    });
  for (const { sireCode, damCode, seenOn } of others)
    warnings.push({ about: 'refusal', text: `${sireCode} × ${damCode} was refused on ${seenOn}.` });
  const percent = `${(relation.inbreeding * 100).toFixed(1).replace(/\.0$/, '')}%`;
  if (relation.inbreeding * 1000 > limits.inbreedingPerMille) {
    warnings.push({
      about: 'relation',
      text: `The young would be inbred by ${percent}; the workspace’s limit is ${(limits.inbreedingPerMille / 10).toFixed(1).replace(/\.0$/, '')}%.`,
    });
  }
  if (relation.words !== 'unrelated')
    warnings.push({
      about: 'relation',
      text: `The two are related: ${sire.code} is ${dam.code}’s ${relation.words}.`,
    });
  return warnings;
}

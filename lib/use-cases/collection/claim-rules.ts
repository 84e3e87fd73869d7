import type { LocusClaim } from '@/lib/contracts/animal';
import type { LocusId } from '@/lib/contracts/ids';
import { ONE, parseProbability, sum } from '@/lib/genetics/fractions';
import { GeneticsError } from '@/lib/genetics/genetics-error';
import { genotypesOf, isLethal, normaliseGenotype, phenotypeChances } from '@/lib/genetics/genotype';
import type { Sex } from '@/lib/contracts/animal';
import type { BeliefLocus, SpeciesBeliefs } from '../genetics/species-beliefs';
import type { FieldError } from '../refusal';

type Claim = { locusId: LocusId } & LocusClaim;

/**
 * What is recorded per locus against the species' loci: known locus, alleles and looks; as many copies as the sex has;
 * odds that add up to 1; a look that the genotypes can give; nothing that dies in the egg.
 */
export function checkClaims(
  species: Pick<SpeciesBeliefs, 'loci' | 'sexSystem'>,
  animal: { code: string; sex: Sex },
  claims: readonly Claim[],
): FieldError[] {
  const errors: FieldError[] = [];
  claims.forEach((claim, index) => {
    const locus = species.loci.find(({ id }) => id === claim.locusId);
    const fail = (part: 'locusId' | 'shows' | 'carries', message: string) =>
      errors.push({ field: `loci.${index}.${part}`, message: `${animal.code}: ${message}` });
    if (!locus) return fail('locusId', 'the species has no such locus.');
    if (claims.findIndex((other) => other.locusId === claim.locusId) < index)
      fail('locusId', `${locus.name} is recorded twice.`);
    checkLooks(species, locus, animal.sex, claim, (message) => fail('shows', message));
    checkCarries(species, locus, animal.sex, claim, (message) => fail('carries', message));
    return undefined;
  });
  return errors;
}

function checkLooks(
  species: Pick<SpeciesBeliefs, 'sexSystem'>,
  { name, definition }: BeliefLocus,
  sex: Sex,
  { shows }: LocusClaim,
  fail: (message: string) => void,
): void {
  if (shows === null) return;
  const living = genotypesOf(definition, sex, species.sexSystem).filter(
    (genotype) => !isLethal(definition, genotype),
  );
  const looks = new Set(living.flatMap((genotype) => [...phenotypeChances(definition, genotype).keys()]));
  if (!looks.has(shows)) {
    const known = [...looks].map((look) => look || 'normal').join(', ');
    fail(
      `${shows ? `"${shows}"` : 'looking normal'} is no look of ${name} in ${sex === 'unknown' ? 'this species' : `a ${sex}`}; it can be ${known}.`,
    );
  }
}

function checkCarries(
  species: Pick<SpeciesBeliefs, 'sexSystem'>,
  { name, definition }: BeliefLocus,
  sex: Sex,
  { shows, carries }: LocusClaim,
  fail: (message: string) => void,
): void {
  if (!carries) return;
  const entries = Object.entries(carries.genotypes);
  if (entries.length === 0) return fail(`say which alleles it carries at ${name}, or leave the locus out.`);
  try {
    for (const [genotype] of entries) {
      const proper = normaliseGenotype(definition, genotype, sex, species.sexSystem);
      if (proper !== genotype) return fail(`write ${proper} instead of ${genotype} at ${name}.`);
      if (isLethal(definition, genotype)) return fail(`eggs that are ${genotype} at ${name} do not hatch.`);
    }
    const odds = entries.map(([, text]) => parseProbability(text, definition.id));
    if (!sum(odds).equals(ONE))
      return fail(`the odds at ${name} add up to ${sum(odds).toFraction()}, not to 1.`);
  } catch (error) {
    if (!(error instanceof GeneticsError)) throw error;
    return fail(error.message);
  }
  if (shows !== null && !entries.some(([genotype]) => phenotypeChances(definition, genotype).has(shows))) {
    fail(`what it carries at ${name} can't look ${shows || 'normal'}.`);
  }
  return undefined;
}

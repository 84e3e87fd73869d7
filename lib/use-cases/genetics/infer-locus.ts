import type { LocusClaim } from '@/lib/contracts/animal';
import type { AnimalId } from '@/lib/contracts/ids';
import { parseProbability } from '@/lib/genetics/fractions';
import { GeneticsError } from '@/lib/genetics/genetics-error';
import type { LocusDefinition, Sex, SexSystem } from '@/lib/genetics/locus';
import { inferPedigree } from '@/lib/genetics/pedigree/infer';
import { rareMutants, type Evidence, type PedigreeMember } from '@/lib/genetics/pedigree/pedigree-input';
import { inferGenotype, mixOdds, type Odds } from './pass-down';

export interface PedigreeAnimal {
  id: AnimalId;
  sex: Sex;
  sireId: AnimalId | null;
  damId: AnimalId | null;
  possibleSires: readonly { sireId: AnimalId; weight: number }[];
}

/**
 * Animals of unknown parents count as wild type unless something of them or their young says otherwise: a mutant among
 * them is so rare that any evidence outweighs it (the trade's convention as a limit).
 */
const FOUNDER_MUTANTS = 1e-5;
/** A record that is wrong is rarer still; it keeps one slip of the pen from making a whole pedigree impossible. */
const SLIP = 1e-30;
/** Chances below one in a thousand are left over from the two above, and are told to nobody. */
const NEGLIGIBLE = 1e-3;

/**
 * What every animal probably is at one locus, by the exact posterior over the whole pedigree. Where that is too large to
 * compute, or the records contradict each other, odds are passed from parents to young only.
 */
export function inferLocus(
  locus: LocusDefinition,
  system: SexSystem,
  animals: readonly PedigreeAnimal[],
  claims: ReadonlyMap<AnimalId, LocusClaim>,
): ReadonlyMap<AnimalId, Odds> {
  if (claims.size === 0) return passDown(locus, system, animals, claims);
  const informed = withInformedAncestors(animals, claims);
  const isFounder = (animal: PedigreeAnimal) => {
    const hasParents = animal.sireId !== null || animal.damId !== null || animal.possibleSires.length > 0;
    // Chances that were stated of an animal whose ancestors say nothing stand as they were stated.
    return !hasParents || (isUncertain(claims.get(animal.id)) && !informed.has(animal.id));
  };
  try {
    const { impossible, beliefs } = inferPedigree({
      sexSystem: system,
      loci: [locus],
      frequencies: { [locus.id]: rareMutants(locus, FOUNDER_MUTANTS) },
      animals: animals.map((animal) =>
        isFounder(animal) ? { id: animal.id, sex: animal.sex } : memberOf(animal),
      ),
      evidence: animals.flatMap((animal) =>
        evidenceOf(locus, animal.id, claims.get(animal.id) ?? null, isFounder(animal)),
      ),
    });
    const found = beliefs.get(locus.id);
    if (impossible || !found) return passDown(locus, system, animals, claims);
    return new Map(animals.map(({ id }) => [id, withoutNegligible(found.get(id) ?? new Map())]));
  } catch (error) {
    if (!(error instanceof GeneticsError)) throw error;
    return passDown(locus, system, animals, claims);
  }
}

const isUncertain = (claim: LocusClaim | undefined) =>
  Object.keys(claim?.carries?.genotypes ?? {}).length > 1;

function memberOf({ id, sex, sireId, damId, possibleSires }: PedigreeAnimal): PedigreeMember {
  const total = possibleSires.reduce((sum, { weight }) => sum + weight, 0);
  const sires =
    sireId === null && total > 0
      ? Object.fromEntries(possibleSires.map((sire) => [sire.sireId, sire.weight / total]))
      : undefined;
  return { id, sex, sire: sireId, dam: damId, ...(sires ? { sires } : {}) };
}

function evidenceOf(
  locus: LocusDefinition,
  animal: AnimalId,
  claim: LocusClaim | null,
  isFounder: boolean,
): Evidence[] {
  if (!claim) return [];
  const evidence: Evidence[] = [];
  if (claim.shows !== null)
    evidence.push({ animal, locus: locus.id, kind: 'phenotype', phenotype: claim.shows, mislabelling: SLIP });
  const stated = Object.entries(claim.carries?.genotypes ?? {});
  const [first] = stated;
  if (first && stated.length === 1)
    evidence.push({ animal, locus: locus.id, kind: 'test', genotype: first[0], error: SLIP });
  // Chances of an animal with known ancestors follow from them; taking them as seen too would count them twice.
  else if (first && isFounder) {
    const genotypes = Object.fromEntries(
      stated.map(([genotype, text]) => [genotype, parseProbability(text, locus.id).valueOf()]),
    );
    evidence.push({ animal, locus: locus.id, kind: 'prior', genotypes });
  }
  return evidence;
}

/** Animals with at least one ancestor of whom something is recorded. */
function withInformedAncestors(
  animals: readonly PedigreeAnimal[],
  claims: ReadonlyMap<AnimalId, LocusClaim>,
): Set<AnimalId> {
  const byId = new Map(animals.map((animal) => [animal.id, animal]));
  const known = new Map<AnimalId, boolean>();
  const isInformed = (id: AnimalId): boolean => {
    const there = known.get(id);
    if (there !== undefined) return there;
    known.set(id, false);
    const animal = byId.get(id);
    const parents = [
      animal?.sireId ?? null,
      animal?.damId ?? null,
      ...(animal?.possibleSires ?? []).map(({ sireId }) => sireId),
    ];
    const informed = parents.some((parent) => parent !== null && (claims.has(parent) || isInformed(parent)));
    known.set(id, informed);
    return informed;
  };
  return new Set(animals.filter(({ id }) => isInformed(id)).map(({ id }) => id));
}

function withoutNegligible(odds: ReadonlyMap<string, number>): Odds {
  const kept = [...odds].filter(([, chance]) => chance >= NEGLIGIBLE);
  const total = kept.reduce((sum, [, chance]) => sum + chance, 0);
  return new Map(kept.map(([genotype, chance]) => [genotype, chance / total]));
}

function passDown(
  locus: LocusDefinition,
  system: SexSystem,
  animals: readonly PedigreeAnimal[],
  claims: ReadonlyMap<AnimalId, LocusClaim>,
): ReadonlyMap<AnimalId, Odds> {
  const byId = new Map(animals.map((animal) => [animal.id, animal]));
  const known = new Map<AnimalId, Odds>();
  const odds = (id: AnimalId): Odds => {
    const there = known.get(id);
    if (there) return there;
    const animal = byId.get(id);
    if (!animal) return inferGenotype(locus, system, { sex: 'unknown', claim: null, sire: null, dam: null });
    const several = animal.possibleSires.map(({ sireId, weight }) => ({ odds: odds(sireId), weight }));
    const inferred = inferGenotype(locus, system, {
      sex: animal.sex,
      claim: claims.get(id) ?? null,
      sire: animal.sireId ? odds(animal.sireId) : mixOdds(several),
      dam: animal.damId ? odds(animal.damId) : null,
    });
    known.set(id, inferred);
    return inferred;
  };
  return new Map(animals.map(({ id }) => [id, odds(id)]));
}

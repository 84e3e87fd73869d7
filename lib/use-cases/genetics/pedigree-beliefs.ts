import 'server-only';
import { loadClaims, loadPedigree, loadSpeciesForComputing, pedigreeFingerprint } from '@/db/queries/lineage';
import type { Transaction } from '@/db/scope';
import type { LocusClaim } from '@/lib/contracts/animal';
import type { AnimalId, LocusId, SpeciesId } from '@/lib/contracts/ids';
import { describeAnimal } from '@/lib/genetics/describe';
import { notFound } from '../refusal';
import { groupBy } from './group-by';
import { isShown, wordsOf } from './copies';
import { inferLocus, type PedigreeAnimal } from './infer-locus';
import type { Odds } from './pass-down';
import { chainHash } from '../hash';
import type { SexSystem } from '@/lib/genetics/locus';
import type { BeliefLocus, LocusBelief, SpeciesBeliefs } from './species-beliefs';

/** Results by species, each with the state of the data that it was computed from. Few, as each holds a whole pedigree. */
const kept = new Map<SpeciesId, { fingerprint: string; beliefs: SpeciesBeliefs }>();
const MOST_KEPT = 24;

/** Chances of carrying below this are left out of the one-line description; the record shows them. */
const LEAST_TOLD = 0.05;

/**
 * What every animal of a species probably carries. The full pedigree of the workspace is used, whoever asks: what a
 * viewer is shown of it is narrowed by the caller. Computed once per state of the data.
 */
export async function loadBeliefs(tx: Transaction, speciesId: SpeciesId): Promise<SpeciesBeliefs> {
  const fingerprint = await pedigreeFingerprint(tx, speciesId);
  const before = kept.get(speciesId);
  if (before?.fingerprint === fingerprint) return before.beliefs;
  const found = await loadSpeciesForComputing(tx, speciesId);
  if (!found) throw notFound('species');
  const beliefs = inferBeliefs(found, await loadPedigree(tx, speciesId), await loadClaims(tx, speciesId));
  kept.delete(speciesId);
  kept.set(speciesId, { fingerprint, beliefs });
  for (const oldest of kept.keys()) {
    if (kept.size <= MOST_KEPT) break;
    kept.delete(oldest);
  }
  return beliefs;
}

/** The last posterior of each locus with what it was computed from: most edits change nothing of it. */
const posteriors = new Map<LocusId, { inputs: string; odds: ReadonlyMap<AnimalId, Odds> }>();
const MOST_POSTERIORS = 400;

function inferOnce(
  locus: BeliefLocus,
  system: SexSystem,
  animals: readonly PedigreeAnimal[],
  claims: ReadonlyMap<AnimalId, LocusClaim>,
): ReadonlyMap<AnimalId, Odds> {
  const inputs = chainHash(null, [locus.definition, system, animals, [...claims]]);
  const before = posteriors.get(locus.id);
  if (before?.inputs === inputs) return before.odds;
  const odds = inferLocus(locus.definition, system, animals, claims);
  posteriors.delete(locus.id);
  posteriors.set(locus.id, { inputs, odds });
  for (const oldest of posteriors.keys()) {
    if (posteriors.size <= MOST_POSTERIORS) break;
    posteriors.delete(oldest);
  }
  return odds;
}

type Loaded = NonNullable<Awaited<ReturnType<typeof loadSpeciesForComputing>>>;
type Pedigree = Awaited<ReturnType<typeof loadPedigree>>;
type Claims = Awaited<ReturnType<typeof loadClaims>>;

function inferBeliefs(
  { species, loci, combinations }: Loaded,
  { rows, possibleSires }: Pedigree,
  claimRows: Claims,
): SpeciesBeliefs {
  const sires = groupBy(possibleSires, (row) => row.animalId);
  const animals = rows.map(({ id, sex, sireId, damId }): PedigreeAnimal => ({
    id,
    sex,
    sireId,
    damId,
    possibleSires: sires.get(id) ?? [],
  }));
  const byId = new Map(animals.map((animal) => [animal.id, animal]));
  const claimsAt = new Map<LocusId, Map<AnimalId, LocusClaim>>(loci.map(({ id }) => [id, new Map()]));
  for (const { animalId, locusId, claim } of claimRows) claimsAt.get(locusId)?.set(animalId, claim);
  // A locus is computed for the whole pedigree at once, when the first animal is asked for.
  const computed = new Map<LocusId, ReadonlyMap<AnimalId, Odds>>();

  const odds = (animalId: AnimalId, locusId: LocusId): Odds => {
    const locus = loci.find(({ id }) => id === locusId);
    if (!locus || !byId.has(animalId))
      throw new RangeError(`No animal ${animalId} or locus ${locusId} in this species.`);
    const all =
      computed.get(locusId) ??
      inferOnce(locus, species.sexSystem, animals, claimsAt.get(locusId) ?? new Map());
    computed.set(locusId, all);
    return all.get(animalId) ?? new Map();
  };

  const belief = (animalId: AnimalId, locusId: LocusId): LocusBelief => {
    const claim = claimsAt.get(locusId)?.get(animalId) ?? null;
    const row = byId.get(animalId);
    const hasParents = Boolean(row?.sireId ?? row?.damId) || sires.has(animalId);
    return {
      locusId,
      genotypes: [...odds(animalId, locusId)]
        .map(([genotype, probability]) => ({ genotype, probability }))
        .sort((a, b) => b.probability - a.probability),
      shows: claim?.shows ?? null,
      source: claim ? 'recorded' : hasParents ? 'relatives' : 'nothing',
    };
  };

  const described = new Map<AnimalId, string>();
  return {
    speciesId: species.id,
    sexSystem: species.sexSystem,
    loci,
    belief,
    describe: (animalId) => {
      const said =
        described.get(animalId) ??
        describeAnimal(
          loci.map(({ id, definition }) => ({
            locus: definition,
            shown: claimsAt.get(id)?.get(animalId)?.shows ?? null,
            belief: odds(animalId, id),
          })),
          combinations,
          LEAST_TOLD,
        );
      described.set(animalId, said);
      return said;
    },
    shows: (one) => isShown({ loci }, one),
    words: (one) => wordsOf({ loci }, one),
  };
}

import 'server-only';
import { and, asc, eq, sql } from 'drizzle-orm';
import type { AnimalId, SpeciesId } from '@/lib/contracts/ids';
import type { Transaction } from '../scope';
import { animalLoci, animals, possibleSires } from '../schema/collection';
import { combinations, loci, species } from '../schema/genetics';
import { visibleAnimal, type Visibility } from './visibility';

/**
 * The whole pedigree of a species in the workspace, for computing only: probabilities and inbreeding need every
 * ancestor, also those that the viewer may not see. What is shown of it is decided by the caller.
 */
export async function loadPedigree(tx: Transaction, speciesId: SpeciesId) {
  const rows = await tx
    .select({
      id: animals.id,
      code: animals.code,
      name: animals.name,
      sex: animals.sex,
      status: animals.status,
      hatchedOn: animals.hatchedOn,
      damId: animals.damId,
      sireId: animals.sireId,
    })
    .from(animals)
    .where(eq(animals.speciesId, speciesId))
    .orderBy(asc(animals.code));
  const sires = await tx
    .select({ animalId: possibleSires.animalId, sireId: possibleSires.sireId, weight: possibleSires.weight })
    .from(possibleSires)
    .innerJoin(
      animals,
      and(eq(animals.workspaceId, possibleSires.workspaceId), eq(animals.id, possibleSires.animalId)),
    )
    .where(eq(animals.speciesId, speciesId))
    .orderBy(asc(possibleSires.animalId), asc(possibleSires.sireId));
  return { rows, possibleSires: sires };
}
export type PedigreeRow = Awaited<ReturnType<typeof loadPedigree>>['rows'][number];

/** What is recorded per locus of every animal of a species, again for computing only. */
export async function loadClaims(tx: Transaction, speciesId: SpeciesId) {
  return tx
    .select({ animalId: animalLoci.animalId, locusId: animalLoci.locusId, claim: animalLoci.claim })
    .from(animalLoci)
    .innerJoin(
      animals,
      and(eq(animals.workspaceId, animalLoci.workspaceId), eq(animals.id, animalLoci.animalId)),
    )
    .where(eq(animals.speciesId, speciesId))
    .orderBy(asc(animalLoci.animalId), asc(animalLoci.locusId));
}

/** A species with its loci and named combinations, to compute with. */
export async function loadSpeciesForComputing(tx: Transaction, speciesId: SpeciesId) {
  const [row] = await tx.select().from(species).where(eq(species.id, speciesId));
  if (!row) return null;
  const rows = await tx
    .select({ id: loci.id, name: loci.name, definition: loci.definition })
    .from(loci)
    .where(eq(loci.speciesId, speciesId))
    .orderBy(asc(loci.name));
  const named = await tx
    .select({ name: combinations.name, phenotypes: combinations.phenotypes })
    .from(combinations)
    .where(eq(combinations.speciesId, speciesId))
    .orderBy(asc(combinations.name));
  // The row's id is the one that claims and combinations go by, wherever the definition was written.
  const defined = rows.map((locus) => ({ ...locus, definition: { ...locus.definition, id: locus.id } }));
  return { species: row, loci: defined, combinations: named };
}

/**
 * A text that changes with every change of the species' animals, claims, possible sires and loci, so that what was
 * computed from them can be kept. Row versions of PostgreSQL (xmin) also move when a seed or another place writes.
 */
export async function pedigreeFingerprint(tx: Transaction, speciesId: SpeciesId): Promise<string> {
  const [row] = await tx.execute<{ fingerprint: string }>(sql`
    with a as (select id, xmin::text::numeric as moved from animals where species_id = ${speciesId})
    select concat_ws(' ',
      (select concat(count(*), ':', sum(moved)) from a),
      (select concat(count(*), ':', sum(c.xmin::text::numeric)) from animal_loci c join a on a.id = c.animal_id),
      (select concat(count(*), ':', sum(p.xmin::text::numeric)) from possible_sires p join a on a.id = p.animal_id),
      (select concat(count(*), ':', sum(l.xmin::text::numeric)) from loci l where l.species_id = ${speciesId}),
      (select concat(count(*), ':', sum(m.xmin::text::numeric)) from combinations m where m.species_id = ${speciesId}),
      (select sp.xmin::text from species sp where sp.id = ${speciesId})) as fingerprint`);
  return row?.fingerprint ?? '';
}

/** The parents of an animal and all theirs, by one recursive query: ids only, for rules that need every ancestor. */
export async function ancestorIds(tx: Transaction, of: readonly AnimalId[]): Promise<Set<AnimalId>> {
  if (of.length === 0) return new Set();
  const rows = await tx.execute<{ id: AnimalId }>(sql`
    with recursive up(id) as (
      select a.id from animals a where a.id in ${of}
      union
      select p.parent from up join lateral (
        select x.dam_id as parent from animals x where x.id = up.id and x.dam_id is not null
        union all select x.sire_id from animals x where x.id = up.id and x.sire_id is not null
        union all select s.sire_id from possible_sires s where s.animal_id = up.id
      ) p on true
    )
    select id from up`);
  return new Set([...rows].map((row) => row.id));
}

/** The animals of a species that are seen. */
export async function visibleIdsOfSpecies(
  tx: Transaction,
  sees: Visibility,
  speciesId: SpeciesId,
): Promise<Set<AnimalId>> {
  const rows = await tx
    .select({ id: animals.id })
    .from(animals)
    .where(and(eq(animals.speciesId, speciesId), visibleAnimal(tx, sees)));
  return new Set(rows.map((row) => row.id));
}

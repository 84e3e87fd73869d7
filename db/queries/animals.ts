import 'server-only';
import { and, asc, desc, eq, inArray, isNull, like, or, sql, type SQL } from 'drizzle-orm';
import type { AnimalStatus, LocusClaim, Sex } from '@/lib/contracts/animal';
import type { AnimalId, LocusId, PartyId, ProjectId, SpeciesId } from '@/lib/contracts/ids';
import type { Transaction } from '../scope';
import {
  animalLoci,
  animals,
  ownershipParts,
  ownerships,
  photos,
  possibleSires,
  tubs,
  weights,
} from '../schema/collection';
import { species } from '../schema/genetics';
import { projectAnimals, projects } from '../schema/projects';
import { clutches, pairings } from '../schema/season';
import { inVisibleProject, visibleAnimal, type Visibility } from './visibility';

export interface AnimalSearch {
  ids?: readonly AnimalId[];
  species?: SpeciesId;
  sex?: Sex;
  status?: 'present' | AnimalStatus;
  project?: ProjectId;
  holder?: PartyId;
}

const PRESENT: AnimalStatus[] = ['here', 'on_loan', 'quarantine'];

function matches(tx: Transaction, search: AnimalSearch): (SQL | undefined)[] {
  const { ids, species: ofSpecies, sex, status, project, holder } = search;
  return [
    ids ? (ids.length ? inArray(animals.id, [...ids]) : sql`false`) : undefined,
    ofSpecies ? eq(animals.speciesId, ofSpecies) : undefined,
    sex ? eq(animals.sex, sex) : undefined,
    status === 'present' ? inArray(animals.status, PRESENT) : status ? eq(animals.status, status) : undefined,
    project
      ? inArray(
          animals.id,
          tx
            .select({ id: projectAnimals.animalId })
            .from(projectAnimals)
            .where(eq(projectAnimals.projectId, project)),
        )
      : undefined,
    holder
      ? inArray(
          animals.id,
          tx
            .select({ id: ownerships.animalId })
            .from(ownerships)
            .innerJoin(
              ownershipParts,
              and(
                eq(ownershipParts.workspaceId, ownerships.workspaceId),
                eq(ownershipParts.ownershipId, ownerships.id),
              ),
            )
            .where(and(isNull(ownerships.untilDay), eq(ownershipParts.partyId, holder))),
        )
      : undefined,
  ];
}

/** Animals that are seen and match, with what a row of the list needs. */
export async function listAnimalRecords(tx: Transaction, sees: Visibility, search: AnimalSearch) {
  return tx
    .select({
      id: animals.id,
      code: animals.code,
      name: animals.name,
      speciesId: animals.speciesId,
      speciesName: species.name,
      sex: animals.sex,
      hatchedOn: animals.hatchedOn,
      hatchedPrecision: animals.hatchedPrecision,
      origin: animals.origin,
      status: animals.status,
      tubId: animals.tubId,
      tubLabel: tubs.label,
      grams: sql<
        number | null
      >`(select w.grams from ${weights} w where w.workspace_id = ${animals.workspaceId} and w.animal_id = ${animals.id} order by w.weighed_on desc, w.id limit 1)`,
    })
    .from(animals)
    .innerJoin(species, and(eq(species.workspaceId, animals.workspaceId), eq(species.id, animals.speciesId)))
    .leftJoin(tubs, and(eq(tubs.workspaceId, animals.workspaceId), eq(tubs.id, animals.tubId)))
    .where(and(visibleAnimal(tx, sees), ...matches(tx, search)))
    .orderBy(asc(animals.code));
}
export type AnimalListRecord = Awaited<ReturnType<typeof listAnimalRecords>>[number];

export async function countVisibleAnimals(tx: Transaction, sees: Visibility): Promise<number> {
  const [row] = await tx
    .select({ n: sql<number>`count(*)::int` })
    .from(animals)
    .where(visibleAnimal(tx, sees));
  return row?.n ?? 0;
}

/** What the rows of one page also show: present parts, visible projects, first photo. */
export async function loadRowExtras(tx: Transaction, sees: Visibility, ids: readonly AnimalId[]) {
  if (ids.length === 0) return { parts: [], projects: [], photos: [] };
  const parts = await tx
    .select({ animalId: ownerships.animalId, partyId: ownershipParts.partyId, parts: ownershipParts.parts })
    .from(ownerships)
    .innerJoin(
      ownershipParts,
      and(
        eq(ownershipParts.workspaceId, ownerships.workspaceId),
        eq(ownershipParts.ownershipId, ownerships.id),
      ),
    )
    .where(and(isNull(ownerships.untilDay), inArray(ownerships.animalId, [...ids])));
  const inProjects = await tx
    .select({ animalId: projectAnimals.animalId, id: projects.id, name: projects.name })
    .from(projectAnimals)
    .innerJoin(
      projects,
      and(eq(projects.workspaceId, projectAnimals.workspaceId), eq(projects.id, projectAnimals.projectId)),
    )
    .where(and(inArray(projectAnimals.animalId, [...ids]), inVisibleProject(sees, projects.id)))
    .orderBy(asc(projects.name));
  const firstPhotos = await tx
    .selectDistinctOn([photos.animalId], { animalId: photos.animalId, id: photos.id })
    .from(photos)
    .where(inArray(photos.animalId, [...ids]))
    .orderBy(photos.animalId, asc(photos.position), asc(photos.createdAt));
  return { parts, projects: inProjects, photos: firstPhotos };
}

/** An animal as it is kept, if it is seen. */
export async function findAnimal(tx: Transaction, sees: Visibility, id: AnimalId) {
  const [row] = await tx
    .select()
    .from(animals)
    .where(and(eq(animals.id, id), visibleAnimal(tx, sees)));
  return row ?? null;
}
export type AnimalRow = NonNullable<Awaited<ReturnType<typeof findAnimal>>>;

/** Those of the animals that are seen; the others are left out. */
export async function findAnimals(tx: Transaction, sees: Visibility, ids: readonly AnimalId[]) {
  if (ids.length === 0) return [];
  return tx
    .select()
    .from(animals)
    .where(and(inArray(animals.id, [...ids]), visibleAnimal(tx, sees)));
}

/** Animals with these codes, whoever may see them: for checks while importing, by those who see everything. */
export async function findAnimalsByCode(tx: Transaction, sees: Visibility, codes: readonly string[]) {
  if (codes.length === 0) return [];
  return tx
    .select()
    .from(animals)
    .where(and(inArray(animals.code, [...codes]), visibleAnimal(tx, sees)));
}

/** Whether a code is taken by another animal; codes are unique in the workspace, seen or not. */
export async function isCodeTaken(tx: Transaction, code: string, except?: AnimalId): Promise<boolean> {
  const [row] = await tx.select({ id: animals.id }).from(animals).where(eq(animals.code, code));
  return row !== undefined && row.id !== except;
}

/** Codes that start with a text, to find the next free one. */
export async function listCodesStartingWith(tx: Transaction, start: string): Promise<string[]> {
  const rows = await tx
    .select({ code: animals.code })
    .from(animals)
    .where(like(animals.code, `${start.replace(/[%_\\]/g, '\\$&')}%`));
  return rows.map((row) => row.code);
}

export async function insertAnimal(
  tx: Transaction,
  row: typeof animals.$inferInsert & { id: AnimalId },
): Promise<void> {
  await tx.insert(animals).values(row);
}

/** @returns whether the row still had the version that was seen */
export async function updateAnimal(
  tx: Transaction,
  id: AnimalId,
  seen: number,
  change: Partial<typeof animals.$inferInsert>,
): Promise<boolean> {
  const rows = await tx
    .update(animals)
    .set({ ...change, version: seen + 1 })
    .where(and(eq(animals.id, id), eq(animals.version, seen)))
    .returning({ id: animals.id });
  return rows.length === 1;
}

/** Sets the same on many animals, raising each one's version. */
export async function updateManyAnimals(
  tx: Transaction,
  ids: readonly AnimalId[],
  change: Partial<typeof animals.$inferInsert>,
): Promise<void> {
  await tx
    .update(animals)
    .set({ ...change, version: sql`${animals.version} + 1` })
    .where(inArray(animals.id, [...ids]));
}

export async function addToProject(
  tx: Transaction,
  rows: (typeof projectAnimals.$inferInsert)[],
): Promise<void> {
  if (rows.length) await tx.insert(projectAnimals).values(rows).onConflictDoNothing();
}

export async function findVisibleProject(tx: Transaction, sees: Visibility, id: ProjectId) {
  const [row] = await tx
    .select()
    .from(projects)
    .where(and(eq(projects.id, id), inVisibleProject(sees, projects.id)));
  return row ?? null;
}

export async function listVisibleProjects(tx: Transaction, sees: Visibility) {
  return tx
    .select({ id: projects.id, name: projects.name, speciesId: projects.speciesId })
    .from(projects)
    .where(inVisibleProject(sees, projects.id))
    .orderBy(asc(projects.name));
}

type ClaimRow = { locusId: LocusId; claim: LocusClaim };

/** Replaces what is recorded of an animal per locus. */
export async function replaceClaims(
  tx: Transaction,
  animal: { workspaceId: AnimalRow['workspaceId']; id: AnimalId },
  claims: readonly ClaimRow[],
  recordedOn: string,
): Promise<void> {
  await tx.delete(animalLoci).where(eq(animalLoci.animalId, animal.id));
  if (claims.length === 0) return;
  await tx
    .insert(animalLoci)
    .values(
      claims.map((row) => ({ ...row, workspaceId: animal.workspaceId, animalId: animal.id, recordedOn })),
    );
}

export async function listClaims(tx: Transaction, animalId: AnimalId): Promise<ClaimRow[]> {
  return tx
    .select({ locusId: animalLoci.locusId, claim: animalLoci.claim })
    .from(animalLoci)
    .where(eq(animalLoci.animalId, animalId));
}

export async function replacePossibleSires(
  tx: Transaction,
  animal: { workspaceId: AnimalRow['workspaceId']; id: AnimalId },
  sires: readonly { animalId: AnimalId; weight: number }[],
): Promise<void> {
  await tx.delete(possibleSires).where(eq(possibleSires.animalId, animal.id));
  if (sires.length === 0) return;
  await tx.insert(possibleSires).values(
    sires.map(({ animalId: sireId, weight }) => ({
      workspaceId: animal.workspaceId,
      animalId: animal.id,
      sireId,
      weight,
    })),
  );
}

export async function listPossibleSires(tx: Transaction, animalId: AnimalId) {
  return tx
    .select({ sireId: possibleSires.sireId, weight: possibleSires.weight })
    .from(possibleSires)
    .where(eq(possibleSires.animalId, animalId))
    .orderBy(desc(possibleSires.weight), asc(possibleSires.sireId));
}

/** The young of an animal, as a rule check needs them (everyone's) and as a record shows them (with `sees`). */
export async function listYoungOf(tx: Transaction, sees: Visibility, parentId: AnimalId) {
  const asPossible = tx
    .select({ id: possibleSires.animalId })
    .from(possibleSires)
    .where(eq(possibleSires.sireId, parentId));
  return tx
    .select()
    .from(animals)
    .where(
      and(
        or(eq(animals.damId, parentId), eq(animals.sireId, parentId), inArray(animals.id, asPossible)),
        visibleAnimal(tx, sees),
      ),
    )
    .orderBy(asc(animals.hatchedOn), asc(animals.code));
}

/** Pairings and clutches of an animal in the projects that are seen, newest first. */
export async function listPairingsOf(tx: Transaction, sees: Visibility, animalId: AnimalId) {
  const of = or(eq(pairings.sireId, animalId), eq(pairings.damId, animalId));
  const paired = await tx
    .select({
      id: pairings.id,
      season: pairings.season,
      status: pairings.status,
      sireId: pairings.sireId,
      damId: pairings.damId,
    })
    .from(pairings)
    .where(and(of, inVisibleProject(sees, pairings.projectId)))
    .orderBy(desc(pairings.season), asc(pairings.createdAt));
  const laid = await tx
    .select({
      id: clutches.id,
      code: clutches.code,
      laidOn: clutches.laidOn,
      sireId: pairings.sireId,
      damId: pairings.damId,
    })
    .from(clutches)
    .innerJoin(
      pairings,
      and(eq(pairings.workspaceId, clutches.workspaceId), eq(pairings.id, clutches.pairingId)),
    )
    .where(and(of, inVisibleProject(sees, clutches.projectId)))
    .orderBy(desc(clutches.laidOn));
  return { paired, laid };
}

export async function findClutchCode(
  tx: Transaction,
  sees: Visibility,
  id: NonNullable<AnimalRow['clutchId']>,
) {
  const [row] = await tx
    .select({ id: clutches.id, code: clutches.code })
    .from(clutches)
    .where(and(eq(clutches.id, id), inVisibleProject(sees, clutches.projectId)));
  return row ?? null;
}

export async function listProjectsOf(tx: Transaction, sees: Visibility, animalId: AnimalId) {
  return tx
    .select({ id: projects.id, name: projects.name })
    .from(projectAnimals)
    .innerJoin(
      projects,
      and(eq(projects.workspaceId, projectAnimals.workspaceId), eq(projects.id, projectAnimals.projectId)),
    )
    .where(and(eq(projectAnimals.animalId, animalId), inVisibleProject(sees, projects.id)))
    .orderBy(asc(projects.name));
}

export async function listWeights(tx: Transaction, animalId: AnimalId) {
  return tx
    .select({ id: weights.id, weighedOn: weights.weighedOn, grams: weights.grams })
    .from(weights)
    .where(eq(weights.animalId, animalId))
    .orderBy(desc(weights.weighedOn), desc(weights.id));
}

export async function insertWeights(tx: Transaction, rows: (typeof weights.$inferInsert)[]): Promise<void> {
  if (rows.length) await tx.insert(weights).values(rows);
}

/** @returns whether there was such a weight of the animal */
export async function deleteWeight(tx: Transaction, animalId: AnimalId, id: string): Promise<boolean> {
  const rows = await tx
    .delete(weights)
    .where(and(eq(weights.animalId, animalId), eq(weights.id, id)))
    .returning({ id: weights.id });
  return rows.length === 1;
}

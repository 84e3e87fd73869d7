import 'server-only';
import { and, asc, eq, ilike, inArray, isNotNull, isNull, notInArray, sql } from 'drizzle-orm';
import type { AnimalId, PartyId, ProjectId } from '@/lib/contracts/ids';
import type { Transaction, Workspace } from '../scope';
import { animals, ownershipParts, ownerships, weights } from '../schema/collection';
import { species } from '../schema/genetics';
import { projectAnimals, projectParties, projects } from '../schema/projects';
import { parties } from '../schema/workspace';
import { inVisibleProject, type Visibility } from './visibility';

const columns = {
  id: projects.id,
  name: projects.name,
  purpose: projects.purpose,
  speciesId: projects.speciesId,
  speciesName: species.name,
  startedOn: projects.startedOn,
  endedOn: projects.endedOn,
  version: projects.version,
  animals: sql<number>`(select count(*)::int from project_animals a where a.workspace_id = ${projects.workspaceId} and a.project_id = ${projects.id})`,
  pairings: sql<number>`(select count(*)::int from pairings p where p.workspace_id = ${projects.workspaceId} and p.project_id = ${projects.id} and p.status <> 'withdrawn')`,
};

function selectProjects(tx: Transaction) {
  return tx
    .select(columns)
    .from(projects)
    .innerJoin(
      species,
      and(eq(species.workspaceId, projects.workspaceId), eq(species.id, projects.speciesId)),
    );
}
export type ProjectRecord = NonNullable<Awaited<ReturnType<typeof findProject>>>;

/** The joint projects that are seen, oldest first. */
export async function listProjectRecords(
  tx: Transaction,
  sees: Visibility,
  filter: { search?: string; ended?: 'yes' | 'no' },
) {
  const text = filter.search ? `%${filter.search.replace(/[%_\\]/g, '\\$&')}%` : null;
  return selectProjects(tx)
    .where(
      and(
        inVisibleProject(sees, projects.id),
        text ? ilike(projects.name, text) : undefined,
        filter.ended === 'yes'
          ? isNotNull(projects.endedOn)
          : filter.ended === 'no'
            ? isNull(projects.endedOn)
            : undefined,
      ),
    )
    .orderBy(asc(projects.startedOn), asc(projects.name));
}

export async function findProject(tx: Transaction, sees: Visibility, id: ProjectId) {
  const [row] = await selectProjects(tx).where(and(eq(projects.id, id), inVisibleProject(sees, projects.id)));
  return row ?? null;
}

/** Parties of projects in rank order, those that have left too. */
export async function listPartiesOfProjects(tx: Transaction, ids: readonly ProjectId[]) {
  if (ids.length === 0) return [];
  return tx
    .select({
      projectId: projectParties.projectId,
      id: parties.id,
      name: parties.name,
      kind: parties.kind,
      mark: parties.mark,
      rank: projectParties.rank,
      joinedOn: projectParties.joinedOn,
      leftOn: projectParties.leftOn,
    })
    .from(projectParties)
    .innerJoin(
      parties,
      and(eq(parties.workspaceId, projectParties.workspaceId), eq(parties.id, projectParties.partyId)),
    )
    .where(inArray(projectParties.projectId, [...ids]))
    .orderBy(asc(projectParties.rank));
}

/** The animals of a project with their newest weight, by code. */
export async function listAnimalsOfProject(tx: Transaction, projectId: ProjectId) {
  return tx
    .select({
      id: animals.id,
      code: animals.code,
      name: animals.name,
      sex: animals.sex,
      status: animals.status,
      hatchedOn: animals.hatchedOn,
      grams: sql<
        number | null
      >`(select w.grams from ${weights} w where w.workspace_id = ${animals.workspaceId} and w.animal_id = ${animals.id} order by w.weighed_on desc, w.id limit 1)`,
      weighedOn: sql<
        string | null
      >`(select w.weighed_on::text from ${weights} w where w.workspace_id = ${animals.workspaceId} and w.animal_id = ${animals.id} order by w.weighed_on desc, w.id limit 1)`,
    })
    .from(projectAnimals)
    .innerJoin(
      animals,
      and(eq(animals.workspaceId, projectAnimals.workspaceId), eq(animals.id, projectAnimals.animalId)),
    )
    .where(eq(projectAnimals.projectId, projectId))
    .orderBy(asc(animals.code));
}

/** The parts in force of animals that the caller has already been let see. */
export async function listPartsInForce(tx: Transaction, animalIds: readonly AnimalId[]) {
  if (animalIds.length === 0) return [];
  return tx
    .select({ animalId: ownerships.animalId, partyId: ownershipParts.partyId, parts: ownershipParts.parts })
    .from(ownerships)
    .innerJoin(
      ownershipParts,
      and(
        eq(ownershipParts.workspaceId, ownerships.workspaceId),
        eq(ownershipParts.ownershipId, ownerships.id),
      ),
    )
    .where(and(isNull(ownerships.untilDay), inArray(ownerships.animalId, [...animalIds])))
    .orderBy(asc(ownershipParts.partyId));
}

export async function isProjectNameTaken(
  tx: Transaction,
  name: string,
  except?: ProjectId,
): Promise<boolean> {
  const [row] = await tx.select({ id: projects.id }).from(projects).where(eq(projects.name, name));
  return row !== undefined && row.id !== except;
}

/** Which of these parties there are in the workspace. */
export async function findParties(tx: Transaction, ids: readonly PartyId[]) {
  if (ids.length === 0) return [];
  return tx
    .select({ id: parties.id, name: parties.name, kind: parties.kind })
    .from(parties)
    .where(inArray(parties.id, [...ids]));
}

export async function insertProject(
  tx: Transaction,
  row: typeof projects.$inferInsert & { id: ProjectId },
): Promise<void> {
  await tx.insert(projects).values(row);
}

/** @returns whether the row still had the version that was seen */
export async function updateProject(
  tx: Transaction,
  id: ProjectId,
  seen: number,
  change: Partial<typeof projects.$inferInsert>,
): Promise<boolean> {
  const rows = await tx
    .update(projects)
    .set({ ...change, version: seen + 1 })
    .where(and(eq(projects.id, id), eq(projects.version, seen)))
    .returning({ id: projects.id });
  return rows.length === 1;
}

/** Sets the parties of a project in rank order from a day on; who is no longer among them has left on that day. */
export async function setProjectParties(
  tx: Transaction,
  workspace: Pick<Workspace, 'id'>,
  projectId: ProjectId,
  ids: readonly PartyId[],
  day: string,
): Promise<void> {
  await tx
    .update(projectParties)
    .set({ leftOn: day })
    .where(
      and(
        eq(projectParties.projectId, projectId),
        isNull(projectParties.leftOn),
        notInArray(projectParties.partyId, [...ids]),
      ),
    );
  for (const [index, partyId] of ids.entries()) {
    const rank = index + 1;
    await tx
      .insert(projectParties)
      .values({ workspaceId: workspace.id, projectId, partyId, rank, joinedOn: day })
      .onConflictDoUpdate({
        target: [projectParties.workspaceId, projectParties.projectId, projectParties.partyId],
        set: { rank, leftOn: null },
      });
  }
}

/** Sets which animals stand in a project. */
export async function setProjectAnimals(
  tx: Transaction,
  workspace: Pick<Workspace, 'id'>,
  projectId: ProjectId,
  ids: readonly AnimalId[],
  day: string,
): Promise<void> {
  await tx
    .delete(projectAnimals)
    .where(
      and(
        eq(projectAnimals.projectId, projectId),
        ids.length ? notInArray(projectAnimals.animalId, [...ids]) : undefined,
      ),
    );
  if (ids.length === 0) return;
  await tx
    .insert(projectAnimals)
    .values(ids.map((animalId) => ({ workspaceId: workspace.id, projectId, animalId, addedOn: day })))
    .onConflictDoNothing();
}

/** Locks a project for the rest of the transaction, so that its agreements are sealed one after the other. */
export async function lockProject(tx: Transaction, id: ProjectId): Promise<void> {
  await tx.select({ id: projects.id }).from(projects).where(eq(projects.id, id)).for('update');
}

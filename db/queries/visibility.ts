import 'server-only';
import { and, eq, inArray, isNull, or, sql, type SQL } from 'drizzle-orm';
import type { AnyPgColumn } from 'drizzle-orm/pg-core';
import type { PartyId, ProjectId } from '@/lib/contracts/ids';
import type { Transaction } from '../scope';
import { animals, ownershipParts, ownerships } from '../schema/collection';
import { projectAnimals } from '../schema/projects';

/**
 * What a member may see of a workspace. Row-level security holds the border of the workspace; this narrows inside it,
 * for partners, to the projects they are in, the animals they hold a part of and their own party.
 */
export type Visibility =
  { everything: true } | { everything: false; partyId: PartyId | null; projectIds: ProjectId[] };

/** Condition on a column with a project's id. Rows without a project are seen only by who sees everything. */
export function inVisibleProject(sees: Visibility, column: AnyPgColumn): SQL | undefined {
  if (sees.everything) return undefined;
  return sees.projectIds.length > 0 ? inArray(column, sees.projectIds) : sql`false`;
}

/** Condition on a column with a party's id: the member's own party only, unless everything is seen. */
function ofVisibleParty(sees: Visibility, column: AnyPgColumn): SQL | undefined {
  if (sees.everything) return undefined;
  return sees.partyId ? eq(column, sees.partyId) : sql`false`;
}

/** Condition on `animals`: animals of a visible project, and those that the party holds (or held) a part of. */
export function visibleAnimal(tx: Transaction, sees: Visibility): SQL | undefined {
  if (sees.everything) return undefined;
  const inProject = tx
    .select({ id: projectAnimals.animalId })
    .from(projectAnimals)
    .where(inVisibleProject(sees, projectAnimals.projectId));
  const hatchedInProject = sees.projectIds.length
    ? sql`exists (select 1 from clutches c where c.workspace_id = ${animals.workspaceId} and c.id = ${animals.clutchId} and c.project_id in ${sees.projectIds})`
    : sql`false`;
  const held = tx
    .select({ id: ownerships.animalId })
    .from(ownerships)
    .innerJoin(
      ownershipParts,
      and(
        eq(ownershipParts.workspaceId, ownerships.workspaceId),
        eq(ownershipParts.ownershipId, ownerships.id),
      ),
    )
    .where(and(ofVisibleParty(sees, ownershipParts.partyId), isNull(ownerships.untilDay)));
  return or(inArray(animals.id, inProject), hatchedInProject, inArray(animals.id, held));
}

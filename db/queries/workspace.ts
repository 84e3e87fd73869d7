import 'server-only';
import { and, asc, count, eq, inArray, isNull } from 'drizzle-orm';
import type { MemberId, UserId } from '@/lib/contracts/ids';
import type { Role } from '@/lib/contracts/roles';
import type { Transaction } from '../scope';
import { notifications } from '../schema/activity';
import { projectParties, projects } from '../schema/projects';
import { members, parties, workspaces } from '../schema/workspace';
import { inVisibleProject, type Visibility } from './visibility';

/** The workspaces a person is a member of today, by name. */
export async function workspacesOfPerson(
  tx: Transaction,
  userId: UserId,
): Promise<{ slug: string; name: string; role: Role }[]> {
  return tx
    .select({ slug: workspaces.slug, name: workspaces.name, role: members.role })
    .from(members)
    .innerJoin(workspaces, eq(workspaces.id, members.workspaceId))
    .where(and(eq(members.userId, userId), isNull(members.endedAt)))
    .orderBy(asc(workspaces.name));
}

export async function listParties(tx: Transaction) {
  return tx
    .select({ id: parties.id, name: parties.name, kind: parties.kind, mark: parties.mark })
    .from(parties)
    .orderBy(asc(parties.createdAt), asc(parties.name));
}

/** The joint projects that are seen, each with its parties in rank order. */
export async function listProjectsWithParties(tx: Transaction, sees: Visibility) {
  const rows = await tx
    .select({ id: projects.id, name: projects.name })
    .from(projects)
    .where(inVisibleProject(sees, projects.id))
    .orderBy(asc(projects.startedOn), asc(projects.name));
  const sides = rows.length
    ? await tx
        .select({
          projectId: projectParties.projectId,
          partyId: projectParties.partyId,
          rank: projectParties.rank,
        })
        .from(projectParties)
        .where(
          and(
            isNull(projectParties.leftOn),
            inArray(
              projectParties.projectId,
              rows.map((row) => row.id),
            ),
          ),
        )
        .orderBy(asc(projectParties.rank))
    : [];
  return rows.map((row) => ({
    ...row,
    parties: sides
      .filter((side) => side.projectId === row.id)
      .map(({ partyId, rank }) => ({ partyId, rank })),
  }));
}

export async function countUnread(tx: Transaction, memberId: MemberId): Promise<number> {
  const [row] = await tx
    .select({ unread: count() })
    .from(notifications)
    .where(and(eq(notifications.memberId, memberId), isNull(notifications.readAt)));
  return row?.unread ?? 0;
}

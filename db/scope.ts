import 'server-only';
import { and, eq, isNull, sql } from 'drizzle-orm';
import type { MemberId, PartyId, ProjectId, UserId, WorkspaceId } from '@/lib/contracts/ids';
import type { Role } from '@/lib/contracts/roles';
import { connectDatabase, type Database } from './connection';
import { projectParties } from './schema/projects';
import { members, workspaces } from './schema/workspace';

export type Transaction = Parameters<Parameters<Database['transaction']>[0]>[0];
export type Workspace = typeof workspaces.$inferSelect;

/** Who is announced to the database; what is left out is announced as nobody. */
export interface Identity {
  workspaceId?: WorkspaceId;
  userId?: UserId;
  /** SHA-256 (hex) of the secret in a link that was followed: opens the one row that carries it. */
  linkHash?: string;
  /** A verified mail address: opens the contacts that carry it. */
  email?: string;
  /** The product itself at work over all workspaces (jobs): may list workspaces, nothing else. */
  system?: boolean;
}

export interface Membership {
  workspace: Workspace;
  memberId: MemberId;
  role: Role;
  partyId: PartyId | null;
  /** The joint projects that the member's party is in today. */
  projectIds: ProjectId[];
}

/**
 * The only way to a transaction: announces the identity for the length of it, so that row-level security filters
 * every statement. A nested announcement goes through `announce`.
 */
export async function withScope<Result>(
  identity: Identity,
  work: (tx: Transaction) => Promise<Result>,
): Promise<Result> {
  return connectDatabase().transaction(async (tx) => {
    await announce(tx, identity);
    return work(tx);
  });
}

/** Replaces the identity of a running transaction, for example once a link has told its workspace. */
async function announce(tx: Transaction, identity: Identity): Promise<void> {
  await tx.execute(sql`select
    set_config('moiety.workspace_id', ${identity.workspaceId ?? ''}, true),
    set_config('moiety.user_id', ${identity.userId ?? ''}, true),
    set_config('moiety.link_hash', ${identity.linkHash ?? ''}, true),
    set_config('moiety.email', ${identity.email?.toLowerCase() ?? ''}, true),
    set_config('moiety.system', ${identity.system ? 'on' : ''}, true)`);
}

/**
 * Proves that a person is a member of a workspace and announces both.
 * @returns null when there is no such workspace or the person is not a member: the two are told apart to nobody
 */
export async function enterWorkspace(
  tx: Transaction,
  slug: string,
  userId: UserId,
): Promise<Membership | null> {
  await announce(tx, { userId });
  const [found] = await tx
    .select({ workspace: workspaces, member: members })
    .from(workspaces)
    .innerJoin(
      members,
      and(eq(members.workspaceId, workspaces.id), eq(members.userId, userId), isNull(members.endedAt)),
    )
    .where(eq(workspaces.slug, slug));
  if (!found) return null;
  await announce(tx, { workspaceId: found.workspace.id, userId });
  const projectIds = found.member.partyId ? await projectsOfParty(tx, found.member.partyId) : [];
  return {
    workspace: found.workspace,
    memberId: found.member.id,
    role: found.member.role,
    partyId: found.member.partyId,
    projectIds,
  };
}

async function projectsOfParty(tx: Transaction, partyId: PartyId): Promise<ProjectId[]> {
  const rows = await tx
    .select({ projectId: projectParties.projectId })
    .from(projectParties)
    .where(and(eq(projectParties.partyId, partyId), isNull(projectParties.leftOn)));
  return rows.map((row) => row.projectId);
}

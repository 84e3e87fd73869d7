import 'server-only';
import { and, asc, desc, eq, inArray, ne, or, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import type { AnimalId, PairingId, PairingVersionId, PartyId, ProjectId } from '@/lib/contracts/ids';
import type { Transaction } from '../scope';
import { users } from '../schema/auth';
import { animals } from '../schema/collection';
import { species } from '../schema/genetics';
import { projects } from '../schema/projects';
import { clutches, pairingDecisions, pairingEvents, pairings, pairingVersions } from '../schema/season';
import { members } from '../schema/workspace';
import { inVisibleProject, type Visibility } from './visibility';

const sires = alias(animals, 'sires');
const dams = alias(animals, 'dams');

function selectPairings(tx: Transaction) {
  return tx
    .select({
      id: pairings.id,
      projectId: pairings.projectId,
      projectName: projects.name,
      season: pairings.season,
      status: pairings.status,
      version: pairings.version,
      createdBy: pairings.createdBy,
      sireId: pairings.sireId,
      sireCode: sires.code,
      sireName: sires.name,
      damId: pairings.damId,
      damCode: dams.code,
      damName: dams.name,
      speciesId: projects.speciesId,
      profile: species.profile,
    })
    .from(pairings)
    .innerJoin(
      projects,
      and(eq(projects.workspaceId, pairings.workspaceId), eq(projects.id, pairings.projectId)),
    )
    .innerJoin(
      species,
      and(eq(species.workspaceId, projects.workspaceId), eq(species.id, projects.speciesId)),
    )
    .innerJoin(sires, and(eq(sires.workspaceId, pairings.workspaceId), eq(sires.id, pairings.sireId)))
    .innerJoin(dams, and(eq(dams.workspaceId, pairings.workspaceId), eq(dams.id, pairings.damId)));
}
export type PairingRecord = NonNullable<Awaited<ReturnType<typeof findPairing>>>;

export interface PairingFilter {
  season?: number;
  project?: ProjectId;
}

/** Pairings that are seen, in the order they were begun. */
export async function listPairingRecords(tx: Transaction, sees: Visibility, filter: PairingFilter) {
  return selectPairings(tx)
    .where(
      and(
        inVisibleProject(sees, pairings.projectId),
        filter.season === undefined ? undefined : eq(pairings.season, filter.season),
        filter.project ? eq(pairings.projectId, filter.project) : undefined,
      ),
    )
    .orderBy(asc(pairings.createdAt), asc(sires.code), asc(dams.code));
}

export async function findPairing(tx: Transaction, sees: Visibility, id: PairingId) {
  const [row] = await selectPairings(tx).where(
    and(eq(pairings.id, id), inVisibleProject(sees, pairings.projectId)),
  );
  return row ?? null;
}

/** Locks a pairing for the rest of the transaction, so that of two decisions at once the second sees the first. */
export async function lockPairing(tx: Transaction, id: PairingId): Promise<void> {
  await tx.select({ id: pairings.id }).from(pairings).where(eq(pairings.id, id)).for('update');
}

/** Seasons in which there are pairings that are seen, newest first. */
export async function listSeasons(tx: Transaction, sees: Visibility): Promise<number[]> {
  const rows = await tx
    .selectDistinct({ season: pairings.season })
    .from(pairings)
    .where(inVisibleProject(sees, pairings.projectId))
    .orderBy(desc(pairings.season));
  return rows.map(({ season }) => season);
}

/** Every proposed version of pairings that the caller has already been let see, newest first. */
export async function listPairingVersions(tx: Transaction, ids: readonly PairingId[]) {
  if (ids.length === 0) return [];
  return tx
    .select({ row: pairingVersions, proposedBy: users.name, proposedByParty: members.partyId })
    .from(pairingVersions)
    .innerJoin(
      members,
      and(eq(members.workspaceId, pairingVersions.workspaceId), eq(members.id, pairingVersions.proposedBy)),
    )
    .innerJoin(users, eq(users.id, members.userId))
    .where(inArray(pairingVersions.pairingId, [...ids]))
    .orderBy(asc(pairingVersions.pairingId), desc(pairingVersions.number));
}
export type PairingVersionRecord = Awaited<ReturnType<typeof listPairingVersions>>[number];

/** Every decision on versions of pairings, oldest first; of a party's several, the last one counts. */
export async function listPairingDecisions(tx: Transaction, ids: readonly PairingVersionId[]) {
  if (ids.length === 0) return [];
  return tx
    .select({
      subjectId: pairingDecisions.pairingVersionId,
      partyId: pairingDecisions.partyId,
      decision: pairingDecisions.decision,
      comment: pairingDecisions.comment,
      by: users.name,
      decidedAt: pairingDecisions.decidedAt,
    })
    .from(pairingDecisions)
    .innerJoin(
      members,
      and(eq(members.workspaceId, pairingDecisions.workspaceId), eq(members.id, pairingDecisions.decidedBy)),
    )
    .innerJoin(users, eq(users.id, members.userId))
    .where(inArray(pairingDecisions.pairingVersionId, [...ids]))
    .orderBy(asc(pairingDecisions.decidedAt));
}

/** What was seen of pairings and not taken back, oldest first. */
export async function listEventsOfPairings(tx: Transaction, ids: readonly PairingId[]) {
  if (ids.length === 0) return [];
  return tx
    .select({ pairingId: pairingEvents.pairingId, kind: pairingEvents.kind, seenOn: pairingEvents.seenOn })
    .from(pairingEvents)
    .where(and(inArray(pairingEvents.pairingId, [...ids]), sql`${pairingEvents.retractedAt} is null`))
    .orderBy(asc(pairingEvents.seenOn));
}

/** The clutches of pairings, the first one first. */
export async function listClutchesOfPairings(tx: Transaction, ids: readonly PairingId[]) {
  if (ids.length === 0) return [];
  return tx
    .select({
      pairingId: clutches.pairingId,
      id: clutches.id,
      code: clutches.code,
      laidOn: clutches.laidOn,
      hatchedOn: clutches.hatchedOn,
      eggs: clutches.eggs,
      slugs: clutches.slugs,
      young: sql<number>`(select count(*)::int from ${animals} y where y.workspace_id = ${clutches.workspaceId} and y.clutch_id = ${clutches.id})`,
    })
    .from(clutches)
    .where(inArray(clutches.pairingId, [...ids]))
    .orderBy(asc(clutches.laidOn));
}

/** Refusals to pair of either animal that were seen and not taken back, newest first, with the partner it refused. */
export async function listRefusals(tx: Transaction, ids: readonly AnimalId[]) {
  if (ids.length === 0) return [];
  return tx
    .select({
      sireId: pairings.sireId,
      damId: pairings.damId,
      season: pairings.season,
      seenOn: pairingEvents.seenOn,
      sireCode: sires.code,
      damCode: dams.code,
    })
    .from(pairingEvents)
    .innerJoin(
      pairings,
      and(eq(pairings.workspaceId, pairingEvents.workspaceId), eq(pairings.id, pairingEvents.pairingId)),
    )
    .innerJoin(sires, and(eq(sires.workspaceId, pairings.workspaceId), eq(sires.id, pairings.sireId)))
    .innerJoin(dams, and(eq(dams.workspaceId, pairings.workspaceId), eq(dams.id, pairings.damId)))
    .where(
      and(
        eq(pairingEvents.kind, 'refusal'),
        sql`${pairingEvents.retractedAt} is null`,
        or(inArray(pairings.sireId, [...ids]), inArray(pairings.damId, [...ids])),
      ),
    )
    .orderBy(desc(pairingEvents.seenOn));
}

/** Whether the two are already paired in a season, in any project. */
export async function isPairedInSeason(
  tx: Transaction,
  pair: { sireId: AnimalId; damId: AnimalId },
  season: number,
  except?: PairingId,
): Promise<boolean> {
  const [row] = await tx
    .select({ id: pairings.id })
    .from(pairings)
    .where(
      and(
        eq(pairings.sireId, pair.sireId),
        eq(pairings.damId, pair.damId),
        eq(pairings.season, season),
        ne(pairings.status, 'withdrawn'),
        except ? ne(pairings.id, except) : undefined,
      ),
    );
  return row !== undefined;
}

export async function insertPairing(
  tx: Transaction,
  row: typeof pairings.$inferInsert & { id: PairingId },
): Promise<void> {
  await tx.insert(pairings).values(row);
}

export async function setPairing(
  tx: Transaction,
  id: PairingId,
  change: Partial<Pick<typeof pairings.$inferInsert, 'status' | 'season'>>,
): Promise<void> {
  await tx
    .update(pairings)
    .set({ ...change, version: sql`${pairings.version} + 1` })
    .where(eq(pairings.id, id));
}

export async function insertPairingVersion(
  tx: Transaction,
  row: typeof pairingVersions.$inferInsert & { id: PairingVersionId },
): Promise<void> {
  await tx.insert(pairingVersions).values(row);
}

export async function insertPairingDecision(
  tx: Transaction,
  row: typeof pairingDecisions.$inferInsert & { partyId: PartyId },
): Promise<void> {
  await tx.insert(pairingDecisions).values(row);
}

export async function lockPairingVersion(
  tx: Transaction,
  id: PairingVersionId,
  seal: { lockedAt: Date; previousHash: string | null; hash: string },
): Promise<void> {
  await tx.update(pairingVersions).set(seal).where(eq(pairingVersions.id, id));
}

/** Hash of the version of a project's pairings that was locked last, to chain the next one to. */
export async function lastPairingHash(tx: Transaction, projectId: ProjectId): Promise<string | null> {
  const [row] = await tx
    .select({ hash: pairingVersions.hash })
    .from(pairingVersions)
    .innerJoin(
      pairings,
      and(eq(pairings.workspaceId, pairingVersions.workspaceId), eq(pairings.id, pairingVersions.pairingId)),
    )
    .where(and(eq(pairings.projectId, projectId), sql`${pairingVersions.lockedAt} is not null`))
    .orderBy(desc(pairingVersions.lockedAt), desc(pairingVersions.number))
    .limit(1);
  return row?.hash ?? null;
}

import 'server-only';
import { and, asc, count, desc, eq, ilike, inArray, isNotNull, or, sql } from 'drizzle-orm';
import type { AnimalId, ContactId, ProjectId } from '@/lib/contracts/ids';
import type { ListingState } from '@/lib/contracts/sale-states';
import type { Transaction } from '../scope';
import { animals } from '../schema/collection';
import { contacts, listings } from '../schema/sales';
import { visibleAnimal, type Visibility } from './visibility';

const projectOf = sql<ProjectId | null>`coalesce(
  (select c.project_id from clutches c where c.workspace_id = ${animals.workspaceId} and c.id = ${animals.clutchId}),
  (select p.project_id from project_animals p where p.workspace_id = ${animals.workspaceId} and p.animal_id = ${animals.id} order by p.added_on, p.project_id limit 1))`;

function selectListings(tx: Transaction) {
  return tx
    .select({
      animalId: animals.id,
      code: animals.code,
      speciesId: animals.speciesId,
      sex: animals.sex,
      status: animals.status,
      hatchedOn: animals.hatchedOn,
      clutchId: animals.clutchId,
      projectId: projectOf,
      projectName: sql<
        string | null
      >`(select name from projects p where p.workspace_id = ${animals.workspaceId} and p.id = ${projectOf})`,
      state: sql<ListingState>`coalesce(${listings.state}, 'not_listed')`,
      price: listings.price,
      headline: sql<string>`coalesce(${listings.headline}, '')`,
      heldForId: listings.heldFor,
      heldForName: contacts.name,
      heldUntil: listings.heldUntil,
      photoId: sql<
        string | null
      >`(select p.id from photos p where p.workspace_id = ${animals.workspaceId} and p.animal_id = ${animals.id} order by p.position, p.created_at limit 1)`,
      version: sql<number>`coalesce(${listings.version}, 0)`,
    })
    .from(animals)
    .leftJoin(listings, and(eq(listings.workspaceId, animals.workspaceId), eq(listings.animalId, animals.id)))
    .leftJoin(
      contacts,
      and(eq(contacts.workspaceId, listings.workspaceId), eq(contacts.id, listings.heldFor)),
    );
}
export type ListingRecord = Awaited<ReturnType<typeof selectListings>>[number];

export interface ListingFilter {
  search?: string;
  state?: ListingState;
  project?: ProjectId;
}

/** Animals that are or could be for sale: those that hatched here and those that were ever priced, youngest first. */
export async function listListingRecords(
  tx: Transaction,
  sees: Visibility,
  filter: ListingFilter,
  page: { offset: number; limit: number },
) {
  const text = filter.search ? `%${filter.search.replace(/[%_\\]/g, '\\$&')}%` : null;
  const where = and(
    visibleAnimal(tx, sees),
    or(isNotNull(animals.clutchId), isNotNull(listings.id)),
    or(sql`${animals.status} not in ('died', 'missing', 'given_away')`, eq(listings.state, 'sold')),
    text
      ? or(ilike(animals.code, text), ilike(animals.name, text), ilike(listings.headline, text))
      : undefined,
    filter.state ? sql`coalesce(${listings.state}, 'not_listed') = ${filter.state}` : undefined,
    filter.project ? sql`${projectOf} = ${filter.project}` : undefined,
  );
  const rows = await selectListings(tx)
    .where(where)
    .orderBy(desc(animals.hatchedOn), asc(animals.code))
    .limit(page.limit)
    .offset(page.offset);
  const [total] = await tx
    .select({ total: count() })
    .from(animals)
    .leftJoin(listings, and(eq(listings.workspaceId, animals.workspaceId), eq(listings.animalId, animals.id)))
    .where(where);
  return { rows, total: total?.total ?? 0 };
}

export async function findListings(
  tx: Transaction,
  sees: Visibility,
  animalIds: AnimalId[],
): Promise<ListingRecord[]> {
  if (animalIds.length === 0) return [];
  return selectListings(tx).where(and(inArray(animals.id, animalIds), visibleAnimal(tx, sees)));
}

type Change = {
  state: ListingState;
  price?: number | null;
  headline?: string;
  heldFor?: ContactId | null;
  heldUntil?: Date | null;
};

/**
 * Saves a listing if it still has the version that was seen (0 = none yet).
 * @returns whether it was saved
 */
export async function saveListing(
  tx: Transaction,
  key: { workspaceId: (typeof listings.$inferInsert)['workspaceId']; animalId: AnimalId; seen: number },
  change: Change,
  now: Date,
): Promise<boolean> {
  const { workspaceId, animalId, seen } = key;
  if (seen === 0) {
    const rows = await tx
      .insert(listings)
      .values({ workspaceId, animalId, ...change, updatedAt: now })
      .onConflictDoNothing()
      .returning({ id: listings.id });
    return rows.length === 1;
  }
  const rows = await tx
    .update(listings)
    .set({ ...change, version: seen + 1, updatedAt: now })
    .where(and(eq(listings.animalId, animalId), eq(listings.version, seen)))
    .returning({ id: listings.id });
  return rows.length === 1;
}

/** Sets the state of several animals' listings, making those that are missing; for what an invoice does to them. */
export async function setListingStates(
  tx: Transaction,
  workspaceId: (typeof listings.$inferInsert)['workspaceId'],
  animalIds: AnimalId[],
  state: ListingState,
  now: Date,
): Promise<void> {
  if (animalIds.length === 0) return;
  await tx
    .insert(listings)
    .values(animalIds.map((animalId) => ({ workspaceId, animalId, state, updatedAt: now })))
    .onConflictDoUpdate({
      target: [listings.workspaceId, listings.animalId],
      set: { state, heldFor: null, heldUntil: null, updatedAt: now, version: sql`${listings.version} + 1` },
    });
}

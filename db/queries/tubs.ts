import 'server-only';
import { and, asc, eq, inArray, sql } from 'drizzle-orm';
import type { TubId } from '@/lib/contracts/ids';
import type { Transaction } from '../scope';
import { animals, tubs } from '../schema/collection';
import { visibleAnimal, type Visibility } from './visibility';

/** Tubs by room, rack and place, with how many animals that are seen live in each. */
export async function listTubs(tx: Transaction, sees: Visibility) {
  return tx
    .select({
      id: tubs.id,
      room: tubs.room,
      rack: tubs.rack,
      label: tubs.label,
      rowNumber: tubs.rowNumber,
      columnNumber: tubs.columnNumber,
      purpose: tubs.purpose,
      animals: sql<number>`count(${animals.id})::int`,
    })
    .from(tubs)
    .leftJoin(
      animals,
      and(
        eq(animals.workspaceId, tubs.workspaceId),
        eq(animals.tubId, tubs.id),
        inArray(animals.status, ['here', 'quarantine']),
        visibleAnimal(tx, sees),
      ),
    )
    .groupBy(tubs.workspaceId, tubs.id)
    .orderBy(asc(tubs.room), asc(tubs.rack), asc(tubs.rowNumber), asc(tubs.columnNumber));
}

export async function findTub(tx: Transaction, id: TubId) {
  const [row] = await tx.select().from(tubs).where(eq(tubs.id, id));
  return row ?? null;
}

export async function findTubAt(
  tx: Transaction,
  place: { room: string; rack: string; rowNumber: number; columnNumber: number },
) {
  const [row] = await tx
    .select({ id: tubs.id, label: tubs.label })
    .from(tubs)
    .where(
      and(
        eq(tubs.room, place.room),
        eq(tubs.rack, place.rack),
        eq(tubs.rowNumber, place.rowNumber),
        eq(tubs.columnNumber, place.columnNumber),
      ),
    );
  return row ?? null;
}

export async function insertTub(
  tx: Transaction,
  row: typeof tubs.$inferInsert & { id: TubId },
): Promise<void> {
  await tx.insert(tubs).values(row);
}

import 'server-only';
import { and, asc, eq, sql } from 'drizzle-orm';
import type { AnimalId, PhotoId } from '@/lib/contracts/ids';
import type { Transaction } from '../scope';
import { animals, photos } from '../schema/collection';
import { visibleAnimal, type Visibility } from './visibility';

/** Photos of an animal that the caller has already been let see, in order. */
export async function listPhotos(tx: Transaction, animalId: AnimalId) {
  return tx
    .select({
      id: photos.id,
      width: photos.width,
      height: photos.height,
      caption: photos.caption,
      takenOn: photos.takenOn,
    })
    .from(photos)
    .where(eq(photos.animalId, animalId))
    .orderBy(asc(photos.position), asc(photos.createdAt));
}

/** A photo, if its animal is seen. */
export async function findPhoto(tx: Transaction, sees: Visibility, id: PhotoId) {
  const [row] = await tx
    .select({ photo: photos, code: animals.code })
    .from(photos)
    .innerJoin(animals, and(eq(animals.workspaceId, photos.workspaceId), eq(animals.id, photos.animalId)))
    .where(and(eq(photos.id, id), visibleAnimal(tx, sees)));
  return row ?? null;
}

export async function insertPhoto(
  tx: Transaction,
  row: typeof photos.$inferInsert & { id: PhotoId },
): Promise<void> {
  const [last] = await tx
    .select({ next: sql<number>`coalesce(max(${photos.position}), -1)::int + 1` })
    .from(photos)
    .where(eq(photos.animalId, row.animalId));
  await tx.insert(photos).values({ ...row, position: last?.next ?? 0 });
}

export async function countPhotos(tx: Transaction, animalId: AnimalId): Promise<number> {
  const [row] = await tx
    .select({ n: sql<number>`count(*)::int` })
    .from(photos)
    .where(eq(photos.animalId, animalId));
  return row?.n ?? 0;
}

export async function updateCaption(tx: Transaction, id: PhotoId, caption: string): Promise<void> {
  await tx.update(photos).set({ caption }).where(eq(photos.id, id));
}

/** Puts a photo before all others of its animal. */
export async function showPhotoFirst(tx: Transaction, animalId: AnimalId, id: PhotoId): Promise<void> {
  const [first] = await tx
    .select({ least: sql<number>`min(${photos.position})::int` })
    .from(photos)
    .where(eq(photos.animalId, animalId));
  await tx
    .update(photos)
    .set({ position: (first?.least ?? 0) - 1 })
    .where(eq(photos.id, id));
}

export async function deletePhoto(tx: Transaction, id: PhotoId): Promise<void> {
  await tx.delete(photos).where(eq(photos.id, id));
}

import 'server-only';
import { and, desc, eq } from 'drizzle-orm';
import type { AnimalId, DocumentId } from '@/lib/contracts/ids';
import type { Transaction } from '../scope';
import { animals, documents } from '../schema/collection';
import { visibleAnimal, type Visibility } from './visibility';

/** Documents of an animal that the caller has already been let see, newest first. */
export async function listDocuments(tx: Transaction, animalId: AnimalId) {
  return tx
    .select({
      id: documents.id,
      name: documents.name,
      contentType: documents.contentType,
      bytes: documents.bytes,
      createdAt: documents.createdAt,
    })
    .from(documents)
    .where(and(eq(documents.subjectKind, 'animal'), eq(documents.subjectId, animalId)))
    .orderBy(desc(documents.createdAt));
}

/** A document of an animal, if the animal is seen. */
export async function findAnimalDocument(tx: Transaction, sees: Visibility, id: DocumentId) {
  const [row] = await tx
    .select({ document: documents, animalId: animals.id, code: animals.code })
    .from(documents)
    .innerJoin(
      animals,
      and(eq(animals.workspaceId, documents.workspaceId), eq(animals.id, documents.subjectId)),
    )
    .where(and(eq(documents.id, id), eq(documents.subjectKind, 'animal'), visibleAnimal(tx, sees)));
  return row ?? null;
}

export async function insertDocument(
  tx: Transaction,
  row: typeof documents.$inferInsert & { id: DocumentId },
): Promise<void> {
  await tx.insert(documents).values(row);
}

export async function deleteDocument(tx: Transaction, id: DocumentId): Promise<void> {
  await tx.delete(documents).where(eq(documents.id, id));
}

import 'server-only';
import { deleteDocument, findAnimalDocument } from '@/db/queries/documents';
import { removeDocument } from '@/lib/contracts/document';
import { afterCommit } from '../after-commit';
import { recordAudit } from '../audit';
import { notFound } from '../refusal';
import { workspaceUseCase } from '../world';

/** A member removes a paper from an animal. */
export const removeDocumentUseCase = workspaceUseCase(removeDocument, async (world, { params }) => {
  const found = await findAnimalDocument(world.tx, world.sees, params.document);
  if (!found) throw notFound('document');
  const { document, animalId, code } = found;
  await deleteDocument(world.tx, document.id);
  afterCommit(world.tx, () => world.services.storage.remove(document.storageKey));
  await recordAudit(world, {
    action: 'document.remove',
    subject: { kind: 'animal', id: animalId },
    detail: { code, name: document.name },
  });
  return { done: true as const };
});

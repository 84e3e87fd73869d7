import 'server-only';
import { createHash } from 'node:crypto';
import { findAnimal } from '@/db/queries/animals';
import { insertDocument } from '@/db/queries/documents';
import { addDocument } from '@/lib/contracts/document';
import type { DocumentId } from '@/lib/contracts/ids';
import { sniffDocument } from '@/lib/services/images';
import { recordAudit } from '../audit';
import { notFound, Refusal } from '../refusal';
import { workspaceUseCase } from '../world';

const MOST_BYTES = 10 * 1024 * 1024;
const notTaken =
  'Only PDF, JPEG, PNG and plain text are kept. This file is something else, whatever its name says.';

/** A member keeps a paper with an animal: an import permit, a health certificate, a receipt. */
export const addDocumentUseCase = workspaceUseCase(addDocument, async (world, { params, body }) => {
  const { tx, sees, workspace, actor, services } = world;
  const animal = await findAnimal(tx, sees, params.animal);
  if (!animal) throw notFound('animal');
  if (body.file.size > MOST_BYTES) throw new Refusal('too_large', 'This document is larger than 10 MB.');
  const content = new Uint8Array(await body.file.arrayBuffer());
  const contentType = sniffDocument(content);
  if (!contentType)
    throw new Refusal('unsupported_file', notTaken, { errors: [{ field: 'file', message: notTaken }] });
  const id = crypto.randomUUID() as DocumentId;
  const storageKey = `documents/${workspace.id}/${id}`;
  await services.storage.write(storageKey, content, contentType);
  const name = (body.name || body.file.name || 'Document').slice(0, 120);
  await insertDocument(tx, {
    workspaceId: workspace.id,
    id,
    subjectKind: 'animal',
    subjectId: animal.id,
    name,
    storageKey,
    contentType,
    bytes: content.byteLength,
    sha256: createHash('sha256').update(content).digest('hex'),
    uploadedBy: actor.memberId,
  });
  await recordAudit(world, {
    action: 'document.add',
    subject: { kind: 'animal', id: animal.id },
    detail: { code: animal.code, name, contentType },
  });
  return { id };
});

import 'server-only';
import { findAnimalDocument } from '@/db/queries/documents';
import { showDocument } from '@/lib/contracts/document';
import { notFound } from '../refusal';
import { workspaceUseCase } from '../world';

const endings: Record<string, string> = {
  'application/pdf': '.pdf',
  'image/jpeg': '.jpg',
  'image/png': '.png',
  'text/plain': '.txt',
};

/** A member opens a paper of an animal that they may see. It is saved as what it is, never run by the browser. */
export const showDocumentUseCase = workspaceUseCase(
  showDocument,
  async ({ tx, sees, services }, { params }) => {
    const found = await findAnimalDocument(tx, sees, params.document);
    const body = found ? await services.storage.read(found.document.storageKey) : null;
    if (!found || !body) throw notFound('document');
    const { name, contentType } = found.document;
    const ending = endings[contentType] ?? '';
    const fileName = name.toLowerCase().endsWith(ending) ? name : name + ending;
    return {
      body,
      contentType: contentType === 'text/plain' ? 'text/plain; charset=utf-8' : contentType,
      fileName,
    };
  },
);

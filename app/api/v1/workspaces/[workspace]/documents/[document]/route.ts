import { handle } from '@/lib/api/handle';
import { showDocumentUseCase } from '@/lib/use-cases/collection/show-document';
import { removeDocumentUseCase } from '@/lib/use-cases/collection/remove-document';

export const GET = handle(showDocumentUseCase);
export const DELETE = handle(removeDocumentUseCase);

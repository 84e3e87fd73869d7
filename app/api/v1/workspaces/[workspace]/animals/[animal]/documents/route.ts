import { handle } from '@/lib/api/handle';
import { addDocumentUseCase } from '@/lib/use-cases/collection/add-document';

export const POST = handle(addDocumentUseCase);

import { handle } from '@/lib/api/handle';
import { previewImportUseCase } from '@/lib/use-cases/collection/preview-import';

export const POST = handle(previewImportUseCase);

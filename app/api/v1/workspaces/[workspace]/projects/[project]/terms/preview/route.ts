import { handle } from '@/lib/api/handle';
import { previewTermsUseCase } from '@/lib/use-cases/projects/preview-terms';

export const POST = handle(previewTermsUseCase);

import { handle } from '@/lib/api/handle';
import { importAnimalsUseCase } from '@/lib/use-cases/collection/import-animals';

export const POST = handle(importAnimalsUseCase);

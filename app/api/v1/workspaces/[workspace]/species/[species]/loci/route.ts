import { handle } from '@/lib/api/handle';
import { createLocusUseCase } from '@/lib/use-cases/collection/create-locus';

export const POST = handle(createLocusUseCase);

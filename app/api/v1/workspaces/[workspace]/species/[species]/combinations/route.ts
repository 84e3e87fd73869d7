import { handle } from '@/lib/api/handle';
import { createCombinationUseCase } from '@/lib/use-cases/collection/create-combination';

export const POST = handle(createCombinationUseCase);

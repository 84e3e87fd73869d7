import { handle } from '@/lib/api/handle';
import { removeCombinationUseCase } from '@/lib/use-cases/collection/remove-combination';

export const DELETE = handle(removeCombinationUseCase);

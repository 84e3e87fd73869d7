import { handle } from '@/lib/api/handle';
import { removeWeightUseCase } from '@/lib/use-cases/collection/remove-weight';

export const DELETE = handle(removeWeightUseCase);

import { handle } from '@/lib/api/handle';
import { addWeightUseCase } from '@/lib/use-cases/collection/add-weight';

export const POST = handle(addWeightUseCase);

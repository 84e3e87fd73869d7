import { handle } from '@/lib/api/handle';
import { showAnimalUseCase } from '@/lib/use-cases/collection/show-animal';
import { editAnimalUseCase } from '@/lib/use-cases/collection/edit-animal';

export const GET = handle(showAnimalUseCase);
export const PATCH = handle(editAnimalUseCase);

import { handle } from '@/lib/api/handle';
import { showSpeciesUseCase } from '@/lib/use-cases/collection/show-species';
import { editSpeciesUseCase } from '@/lib/use-cases/collection/edit-species';

export const GET = handle(showSpeciesUseCase);
export const PATCH = handle(editSpeciesUseCase);

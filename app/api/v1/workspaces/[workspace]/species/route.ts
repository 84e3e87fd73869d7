import { handle } from '@/lib/api/handle';
import { listSpeciesUseCase } from '@/lib/use-cases/collection/list-species';
import { createSpeciesUseCase } from '@/lib/use-cases/collection/create-species';

export const GET = handle(listSpeciesUseCase);
export const POST = handle(createSpeciesUseCase);

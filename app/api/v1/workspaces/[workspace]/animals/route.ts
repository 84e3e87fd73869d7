import { handle } from '@/lib/api/handle';
import { listAnimalsUseCase } from '@/lib/use-cases/collection/list-animals';
import { createAnimalUseCase } from '@/lib/use-cases/collection/create-animal';

export const GET = handle(listAnimalsUseCase);
export const POST = handle(createAnimalUseCase);

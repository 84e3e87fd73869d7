import { handle } from '@/lib/api/handle';
import { listTubsUseCase } from '@/lib/use-cases/collection/list-tubs';
import { createTubUseCase } from '@/lib/use-cases/collection/create-tub';

export const GET = handle(listTubsUseCase);
export const POST = handle(createTubUseCase);

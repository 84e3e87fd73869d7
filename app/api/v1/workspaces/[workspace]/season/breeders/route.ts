import { handle } from '@/lib/api/handle';
import { listBreedersUseCase } from '@/lib/use-cases/season/list-breeders';

export const GET = handle(listBreedersUseCase);

import { handle } from '@/lib/api/handle';
import { listClutchesUseCase } from '@/lib/use-cases/season/list-clutches';

export const GET = handle(listClutchesUseCase);

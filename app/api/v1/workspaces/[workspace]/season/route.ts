import { handle } from '@/lib/api/handle';
import { showSeasonUseCase } from '@/lib/use-cases/season/show-season';

export const GET = handle(showSeasonUseCase);

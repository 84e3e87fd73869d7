import { handle } from '@/lib/api/handle';
import { showMeUseCase } from '@/lib/use-cases/workspace/show-me';

export const GET = handle(showMeUseCase);

import { handle } from '@/lib/api/handle';
import { layClutchUseCase } from '@/lib/use-cases/season/lay-clutch';

export const POST = handle(layClutchUseCase);

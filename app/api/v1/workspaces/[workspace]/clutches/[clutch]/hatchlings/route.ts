import { handle } from '@/lib/api/handle';
import { logHatchlingsUseCase } from '@/lib/use-cases/season/log-hatchlings';

export const POST = handle(logHatchlingsUseCase);

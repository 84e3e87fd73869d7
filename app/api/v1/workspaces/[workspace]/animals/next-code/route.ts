import { handle } from '@/lib/api/handle';
import { proposeCodeUseCase } from '@/lib/use-cases/collection/propose-code';

export const GET = handle(proposeCodeUseCase);

import { handle } from '@/lib/api/handle';
import { decideTermsUseCase } from '@/lib/use-cases/projects/decide-terms';

export const POST = handle(decideTermsUseCase);

import { handle } from '@/lib/api/handle';
import { withdrawTermsUseCase } from '@/lib/use-cases/projects/withdraw-terms';

export const POST = handle(withdrawTermsUseCase);

import { handle } from '@/lib/api/handle';
import { showTermsUseCase } from '@/lib/use-cases/projects/show-terms';

export const GET = handle(showTermsUseCase);

import { handle } from '@/lib/api/handle';
import { listTermsUseCase } from '@/lib/use-cases/projects/list-terms';
import { proposeTermsUseCase } from '@/lib/use-cases/projects/propose-terms';

export const GET = handle(listTermsUseCase);
export const POST = handle(proposeTermsUseCase);

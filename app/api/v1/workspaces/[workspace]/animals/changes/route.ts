import { handle } from '@/lib/api/handle';
import { changeAnimalsUseCase } from '@/lib/use-cases/collection/change-animals';

export const POST = handle(changeAnimalsUseCase);

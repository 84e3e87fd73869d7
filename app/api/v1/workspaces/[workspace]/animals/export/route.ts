import { handle } from '@/lib/api/handle';
import { exportAnimalsUseCase } from '@/lib/use-cases/collection/export-animals';

export const GET = handle(exportAnimalsUseCase);

import { handle } from '@/lib/api/handle';
import { showLineageUseCase } from '@/lib/use-cases/collection/show-lineage';

export const GET = handle(showLineageUseCase);

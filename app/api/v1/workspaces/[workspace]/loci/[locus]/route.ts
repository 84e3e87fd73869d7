import { handle } from '@/lib/api/handle';
import { editLocusUseCase } from '@/lib/use-cases/collection/edit-locus';
import { removeLocusUseCase } from '@/lib/use-cases/collection/remove-locus';

export const PATCH = handle(editLocusUseCase);
export const DELETE = handle(removeLocusUseCase);

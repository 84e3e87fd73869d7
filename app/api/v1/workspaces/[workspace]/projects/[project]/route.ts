import { handle } from '@/lib/api/handle';
import { editProjectUseCase } from '@/lib/use-cases/projects/edit-project';
import { showProjectUseCase } from '@/lib/use-cases/projects/show-project';

export const GET = handle(showProjectUseCase);
export const PATCH = handle(editProjectUseCase);

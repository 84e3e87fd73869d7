import { handle } from '@/lib/api/handle';
import { createProjectUseCase } from '@/lib/use-cases/projects/create-project';
import { listProjectsUseCase } from '@/lib/use-cases/projects/list-projects';

export const GET = handle(listProjectsUseCase);
export const POST = handle(createProjectUseCase);

import { handle } from '@/lib/api/handle';
import { showWorkspaceUseCase } from '@/lib/use-cases/workspace/show-workspace';

export const GET = handle(showWorkspaceUseCase);

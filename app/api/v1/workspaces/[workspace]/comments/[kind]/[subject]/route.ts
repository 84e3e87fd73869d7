import { handle } from '@/lib/api/handle';
import { listCommentsUseCase } from '@/lib/use-cases/projects/list-comments';
import { writeCommentUseCase } from '@/lib/use-cases/projects/write-comment';

export const GET = handle(listCommentsUseCase);
export const POST = handle(writeCommentUseCase);

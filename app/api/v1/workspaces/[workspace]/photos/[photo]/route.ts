import { handle } from '@/lib/api/handle';
import { showPhotoUseCase } from '@/lib/use-cases/collection/show-photo';
import { editPhotoUseCase } from '@/lib/use-cases/collection/edit-photo';
import { removePhotoUseCase } from '@/lib/use-cases/collection/remove-photo';

export const GET = handle(showPhotoUseCase);
export const PATCH = handle(editPhotoUseCase);
export const DELETE = handle(removePhotoUseCase);

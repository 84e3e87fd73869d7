import { handle } from '@/lib/api/handle';
import { addPhotoUseCase } from '@/lib/use-cases/collection/add-photo';

export const POST = handle(addPhotoUseCase);

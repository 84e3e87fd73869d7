import { handle } from '@/lib/api/handle';
import { editClutchUseCase } from '@/lib/use-cases/season/edit-clutch';
import { showClutchUseCase } from '@/lib/use-cases/season/show-clutch';

export const GET = handle(showClutchUseCase);
export const PATCH = handle(editClutchUseCase);

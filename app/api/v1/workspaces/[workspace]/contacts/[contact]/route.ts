import { handle } from '@/lib/api/handle';
import { editContactUseCase } from '@/lib/use-cases/sales/edit-contact';
import { showContactUseCase } from '@/lib/use-cases/sales/show-contact';

export const GET = handle(showContactUseCase);
export const PATCH = handle(editContactUseCase);

import { handle } from '@/lib/api/handle';
import { createContactUseCase } from '@/lib/use-cases/sales/create-contact';
import { listContactsUseCase } from '@/lib/use-cases/sales/list-contacts';

export const GET = handle(listContactsUseCase);
export const POST = handle(createContactUseCase);

import { handle } from '@/lib/api/handle';
import { mailContactUseCase } from '@/lib/use-cases/sales/mail-contact';

export const POST = handle(mailContactUseCase);

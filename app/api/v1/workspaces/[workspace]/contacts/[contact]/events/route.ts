import { handle } from '@/lib/api/handle';
import { noteOnContactUseCase } from '@/lib/use-cases/sales/note-on-contact';

export const POST = handle(noteOnContactUseCase);

import { handle } from '@/lib/api/handle';
import { voidInvoiceUseCase } from '@/lib/use-cases/sales/void-invoice';

export const POST = handle(voidInvoiceUseCase);

import { handle } from '@/lib/api/handle';
import { showInvoiceUseCase } from '@/lib/use-cases/sales/show-invoice';

export const GET = handle(showInvoiceUseCase);

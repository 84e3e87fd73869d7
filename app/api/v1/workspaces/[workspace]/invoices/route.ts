import { handle } from '@/lib/api/handle';
import { createInvoiceUseCase } from '@/lib/use-cases/sales/create-invoice';
import { listInvoicesUseCase } from '@/lib/use-cases/sales/list-invoices';

export const GET = handle(listInvoicesUseCase);
export const POST = handle(createInvoiceUseCase);

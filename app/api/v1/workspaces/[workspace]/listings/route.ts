import { handle } from '@/lib/api/handle';
import { listListingsUseCase } from '@/lib/use-cases/sales/list-listings';

export const GET = handle(listListingsUseCase);

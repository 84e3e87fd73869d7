import { handle } from '@/lib/api/handle';
import { priceAnimalUseCase } from '@/lib/use-cases/sales/price-animal';

export const PUT = handle(priceAnimalUseCase);

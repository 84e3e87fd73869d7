import { handle } from '@/lib/api/handle';
import { recordOwnershipUseCase } from '@/lib/use-cases/collection/record-ownership';

export const POST = handle(recordOwnershipUseCase);

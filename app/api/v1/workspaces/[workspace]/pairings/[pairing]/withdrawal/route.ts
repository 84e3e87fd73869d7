import { handle } from '@/lib/api/handle';
import { withdrawPairingUseCase } from '@/lib/use-cases/season/withdraw-pairing';

export const POST = handle(withdrawPairingUseCase);

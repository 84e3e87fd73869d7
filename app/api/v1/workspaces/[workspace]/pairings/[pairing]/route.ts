import { handle } from '@/lib/api/handle';
import { showPairingUseCase } from '@/lib/use-cases/season/show-pairing';

export const GET = handle(showPairingUseCase);

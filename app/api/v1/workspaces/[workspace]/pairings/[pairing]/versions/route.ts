import { handle } from '@/lib/api/handle';
import { proposePairingAgainUseCase } from '@/lib/use-cases/season/propose-pairing-again';

export const POST = handle(proposePairingAgainUseCase);

import { handle } from '@/lib/api/handle';
import { listPairingsUseCase } from '@/lib/use-cases/season/list-pairings';
import { proposePairingUseCase } from '@/lib/use-cases/season/propose-pairing';

export const GET = handle(listPairingsUseCase);
export const POST = handle(proposePairingUseCase);

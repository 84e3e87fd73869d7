import { handle } from '@/lib/api/handle';
import { retractPairingEventUseCase } from '@/lib/use-cases/season/retract-pairing-event';

export const POST = handle(retractPairingEventUseCase);

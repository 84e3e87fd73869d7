import { handle } from '@/lib/api/handle';
import { listPairingEventsUseCase } from '@/lib/use-cases/season/list-pairing-events';
import { logPairingEventUseCase } from '@/lib/use-cases/season/log-pairing-event';

export const GET = handle(listPairingEventsUseCase);
export const POST = handle(logPairingEventUseCase);

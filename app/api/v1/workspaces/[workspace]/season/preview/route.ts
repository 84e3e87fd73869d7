import { handle } from '@/lib/api/handle';
import { previewPairingUseCase } from '@/lib/use-cases/season/preview-pairing';

export const POST = handle(previewPairingUseCase);

import { handle } from '@/lib/api/handle';
import { decidePairingUseCase } from '@/lib/use-cases/season/decide-pairing';

export const POST = handle(decidePairingUseCase);

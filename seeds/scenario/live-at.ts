import { addDays } from 'date-fns';
import { setClock } from '@/lib/services/clock';
import type { Caller } from '@/lib/use-cases/perform';
import { identify } from '../identify';
import type { DemoPerson } from './people';

/** Lets what follows happen at another day, counted from the day of seeding. */
export function liveAt(now: Date, days: number): void {
  const then = addDays(now, days);
  setClock(() => then);
}

/** The person as a caller of use cases; `intention` names a write that is done once. */
export function callerOf({ userId, name, email }: DemoPerson, intention?: string): Caller {
  return {
    person: { userId, name, email },
    ...(intention ? { idempotencyKey: identify(`intention ${intention}`) } : {}),
  };
}

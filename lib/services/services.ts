import 'server-only';
import type { CardPayments } from './payments';
import type { FileStorage } from './file-storage';
import type { JobQueue } from './jobs';

/** The outside world, behind small interfaces. */
export interface Services {
  payments: CardPayments;
  storage: FileStorage;
  jobs: JobQueue;
}

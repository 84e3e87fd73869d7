import 'server-only';
import { configuration } from './configuration';
import { openStorage } from './file-storage';
import { jobQueue } from './jobs';
import { createCardPayments, type CardPayments } from './payments';
import type { Services } from './services';

let known: Services | undefined;

/** The services that the configuration names; each connects when it is first used, not here. */
export function openServices(): Services {
  known ??= {
    get payments(): CardPayments {
      return createCardPayments(configuration().payments);
    },
    get storage() {
      return openStorage();
    },
    jobs: jobQueue,
  };
  return known;
}

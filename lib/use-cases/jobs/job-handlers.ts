import 'server-only';
import type { JobHandlers } from '@/lib/services/jobs';
import { sendMail } from './send-mail';
import { sweepMail } from './sweep-mail';

/** What the process does for each kind of job. */
export const jobHandlers: JobHandlers = {
  'mail.send': sendMail,
  'mail.sweep': () => sweepMail(),
};

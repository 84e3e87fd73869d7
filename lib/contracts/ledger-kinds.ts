import { z } from 'zod';

export const accountType = z.enum(['asset', 'liability', 'equity', 'revenue', 'expense']);
export type AccountType = z.infer<typeof accountType>;

/** What the product uses an account for; the accountant may rename and renumber it. */
export const accountPurpose = z.string().min(1).max(60);
export type AccountPurpose = z.infer<typeof accountPurpose>;

export const entryCauseKind = z.enum([
  'payment',
  'refund',
  'expense',
  'delivery',
  'settlement',
  'transfer',
  'dispute',
  'correction',
  'payout',
]);
export type EntryCauseKind = z.infer<typeof entryCauseKind>;

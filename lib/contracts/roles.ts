import { z } from 'zod';

/** What a member is in a workspace. Buyers are not members: they reach only their own invoices and papers. */
export const role = z.enum(['owner', 'partner', 'keeper', 'accountant']);
export type Role = z.infer<typeof role>;

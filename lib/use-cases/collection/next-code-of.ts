import 'server-only';
import { listCodesStartingWith } from '@/db/queries/animals';
import type { Transaction } from '@/db/scope';
import { nextCodes } from '../season/next-code';

/** The next free code of a species' letters, such as "BP-102". */
export async function nextCodeOf(tx: Transaction, codePrefix: string): Promise<string> {
  const start = `${codePrefix}-`;
  const [code = `${start}001`] = nextCodes(start, await listCodesStartingWith(tx, start), 1, 3);
  return code;
}

import 'server-only';
import type { Transaction } from '@/db/scope';

const waiting = new WeakMap<Transaction, (() => Promise<void>)[]>();

/** Asks for work to be done once the transaction has been committed, such as handing a mail to the job queue. */
export function afterCommit(tx: Transaction, work: () => Promise<void>): void {
  const list = waiting.get(tx) ?? [];
  list.push(work);
  waiting.set(tx, list);
}

/** What was asked for so far; the caller does it after the commit. */
export function takeAfterCommit(tx: Transaction): (() => Promise<void>)[] {
  const list = waiting.get(tx) ?? [];
  waiting.delete(tx);
  return list;
}
